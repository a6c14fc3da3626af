/** Makes a shop with its people and prints them as JSON. Bundled and run by `shop.ts`, because queries do not load in the test runner. */
import { openPool } from "@/lib/server/database";
import { makeShop, testPassword } from "../../support/shop";

const { owner, maker, assistant, sawId } = await makeShop(process.argv[2] ?? "Test shop");
const person = ({ email, userName }: typeof owner) => ({ email, name: userName, password: testPassword });
console.log(JSON.stringify({ owner: person(owner), maker: person(maker), assistant: person(assistant), sawId }));
await openPool().pool.end();
