import { parseEnv } from "node:util";
import { expect, test } from "vitest";
import { mergeSettings } from "../../scripts/ground/settings.mjs";

test("the shell wins over the file", () => {
  const file = parseEnv('PORT=3000\nAPP_URL="https://wood.example" # where people come in\n');
  expect(mergeSettings(file, { PORT: "4000" })).toEqual({ PORT: "4000", APP_URL: "https://wood.example" });
});

test("an empty value is as good as none", () => {
  expect(mergeSettings({ DATABASE_URL: "mysql://a/b" }, { DATABASE_URL: "" }).DATABASE_URL).toBe("mysql://a/b");
  expect(mergeSettings({ DATABASE_URL: "" }, {}).DATABASE_URL).toBeUndefined();
});

test("a quoted secret may hold signs that mean something elsewhere", () => {
  expect(mergeSettings(parseEnv("SESSION_SECRET='a=b#c $d'")).SESSION_SECRET).toBe("a=b#c $d");
});
