/** Signing in and out, and what the session gate lets through. */
import "../support/cookie-jar";
import { eq } from "drizzle-orm";
import { v7 as newId } from "uuid";
import { beforeAll, beforeEach, describe, expect, it } from "vitest";
import * as sessionRoute from "@/app/api/session/route";
import * as sessionsRoute from "@/app/api/sessions/route";
import * as shopRoute from "@/app/api/shop/route";
import * as sawsRoute from "@/app/api/shop/saws/route";
import { session } from "@/db/schema";
import * as endpoint from "@/lib/schemas/session";
import * as shopEndpoint from "@/lib/schemas/shop";
import { database } from "@/lib/server/database";
import { env } from "@/lib/server/env";
import { ask } from "../support/ask";
import { emptyJar, fillJar, jarContent } from "../support/cookie-jar";
import { makeShop, type TestShop, testPassword } from "../support/shop";

let shop: TestShop;
beforeAll(async () => {
  shop = await makeShop("Session shop");
});
beforeEach(emptyJar);

const signIn = (email: string, password: string, headers?: Record<string, string>) =>
  ask(
    sessionRoute.POST,
    endpoint.signIn,
    { body: { email, password } },
    headers ?? { origin: env().APP_URL, "x-forwarded-for": newId() },
  );
const whoAmI = () => ask(sessionRoute.GET, endpoint.getSession, {});
const saw = { name: "Frame saw", kind: "hand", kerf: 800, cleanUp: 300 } as const;

describe("signing in", () => {
  it("opens a session that names person, shop and role", async () => {
    const answer = await signIn(shop.maker.email.toUpperCase(), testPassword);
    expect(answer.status).toBe(200);
    expect(endpoint.sessionSchema.parse((await whoAmI()).body)).toMatchObject({ role: "maker", shop: { name: "Session shop" } });
  });

  it("keeps nothing in the cookie but a sealed id", async () => {
    await signIn(shop.maker.email, testPassword);
    const cookie = [...jarContent().values()].join();
    expect(cookie).not.toContain(shop.maker.userId);
    expect(cookie).not.toContain(shop.maker.email);
  });

  it("says the same to a wrong password and to an unknown address", async () => {
    const wrong = await signIn(shop.maker.email, "not the password");
    const unknown = await signIn(`${newId()}@nobody.example`, testPassword);
    expect(wrong.status).toBe(401);
    expect(unknown.status).toBe(401);
    expect(wrong.body).toMatchObject({ title: (unknown.body as { title: string }).title });
  });

  it("refuses the ninth try on one account within a quarter of an hour, even with the right password", async () => {
    const other = await makeShop();
    for (let tries = 0; tries < 8; tries++) expect((await signIn(other.maker.email, "wrong")).status).toBe(401);
    expect((await signIn(other.maker.email, testPassword)).status).toBe(429);
  });

  it("refuses a session whose cookie was made up", async () => {
    await signIn(shop.maker.email, testPassword);
    fillJar(new Map([...jarContent()].map(([name, value]) => [name, `${value.slice(0, -4)}AAAA`])));
    expect((await whoAmI()).status).toBe(401);
  });

  it("refuses a session that has ended", async () => {
    await signIn(shop.maker.email, testPassword);
    await database()
      .update(session)
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where(eq(session.userId, shop.maker.userId));
    expect((await whoAmI()).status).toBe(401);
  });
});

describe("ended sessions", () => {
  it("are swept out by the next person who signs in", async () => {
    const id = newId();
    const { userId, shopId } = shop.maker;
    const long = new Date(Date.now() - 60_000);
    await database().insert(session).values({ id, userId, shopId, device: "old tablet", createdAt: long, expiresAt: long });
    await signIn((await makeShop()).owner.email, testPassword);
    expect(await database().select().from(session).where(eq(session.id, id))).toEqual([]);
  });
});

describe("signing out", () => {
  it("ends this session on the server, so the old cookie opens nothing", async () => {
    await signIn(shop.maker.email, testPassword);
    const kept = jarContent();
    expect((await ask(sessionRoute.DELETE, endpoint.signOut, {})).status).toBe(204);
    fillJar(kept);
    expect((await whoAmI()).status).toBe(401);
  });

  it("everywhere ends the sessions of every device of that person and of nobody else", async () => {
    await signIn(shop.assistant.email, testPassword);
    const assistant = jarContent();
    emptyJar();
    await signIn(shop.owner.email, testPassword);
    const tablet = jarContent();
    emptyJar();
    await signIn(shop.owner.email, testPassword);
    expect(await ask(sessionsRoute.DELETE, endpoint.signOutEverywhere, {})).toMatchObject({ status: 200, body: { ended: 2 } });
    fillJar(tablet);
    expect((await whoAmI()).status).toBe(401);
    fillJar(assistant);
    expect((await whoAmI()).status).toBe(200);
  });
});

describe("the gate", () => {
  it("asks for a session", async () => {
    expect((await ask(shopRoute.GET, shopEndpoint.getShop, {})).status).toBe(401);
  });

  it("asks for the role: an assistant reads the shop but adds no saw", async () => {
    await signIn(shop.assistant.email, testPassword);
    expect((await ask(shopRoute.GET, shopEndpoint.getShop, {})).status).toBe(200);
    const refused = await ask(sawsRoute.POST, shopEndpoint.createSaw, { body: saw });
    expect(refused).toMatchObject({ status: 403, body: { code: "not-allowed" } });
  });

  it("takes writes from our own pages only", async () => {
    await signIn(shop.maker.email, testPassword);
    const write = (headers: Record<string, string>) => ask(sawsRoute.POST, shopEndpoint.createSaw, { body: saw }, headers);
    expect((await write({ origin: "https://elsewhere.example" })).status).toBe(403);
    expect((await write({})).status).toBe(403);
    expect((await write({ "sec-fetch-site": "cross-site" })).status).toBe(403);
    expect((await write({ origin: env().APP_URL })).status).toBe(200);
  });

  it("answers nonsense with what is wrong, by field", async () => {
    await signIn(shop.maker.email, testPassword);
    const answer = await ask(sawsRoute.POST, shopEndpoint.createSaw, { body: { ...saw, kerf: -1 } });
    expect(answer).toMatchObject({ status: 400, body: { code: "bad-request", fields: { kerf: [expect.any(String)] } } });
  });

  it("refuses a body that is larger than any request of ours, whether it says so or not", async () => {
    const body = JSON.stringify({ email: shop.maker.email, password: "x".repeat(3 * 1024 * 1024) });
    const post = (headers: Record<string, string>) =>
      sessionRoute.POST(
        new Request(`${env().APP_URL}/api/session`, { method: "POST", body, headers: { origin: env().APP_URL, ...headers } }),
        { params: Promise.resolve({}) },
      );
    expect((await post({})).status).toBe(413);
    expect((await post({ "content-length": String(body.length) })).status).toBe(413);
  });

  it("tells browsers to take its answers for JSON and nothing else", async () => {
    const { headers } = await whoAmI();
    expect(headers.get("x-content-type-options")).toBe("nosniff");
    expect(headers.get("content-security-policy")).toContain("default-src 'none'");
  });

  it("gives every answer a request id", async () => {
    expect((await whoAmI()).headers.get("x-request-id")).toMatch(/^[0-9a-f-]{36}$/);
  });
});
