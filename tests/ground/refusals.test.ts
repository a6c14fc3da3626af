import { expect, test } from "vitest";
import { readArguments } from "../../scripts/commands/test.mjs";
import { firstDifference } from "../../scripts/ground/dependencies.mjs";
import { isNodeSupported } from "../../scripts/ground/node-version.mjs";
import { missingPackages, packagesRefusal } from "../../scripts/ground/packages.mjs";
import { Refusal, wordsFor } from "../../scripts/ground/say.mjs";

test("missing packages are named with the line that installs them", () => {
  const words = wordsFor(packagesRefusal(["mariadb-server-core", "chromium"]));
  expect(words).toContain("Missing from this machine: mariadb-server-core, chromium.");
  expect(words).toContain("sudo apt-get install --no-install-recommends mariadb-server-core chromium");
});

test("packages whose programs are here are not missing", () => {
  expect(missingPackages(["database", "browser", "pdfReader"])).toEqual([]);
});

test("a refusal is told in two lines, anything unforeseen with where it happened", () => {
  expect(wordsFor(new Refusal("It is taken.", "Try another."))).toBe("It is taken.\nTry another.");
  expect(wordsFor(new TypeError("odd"))).toContain("refusals.test");
});

test.each([
  ["18.20.4", false],
  ["20.18.0", false],
  ["20.19.0", true],
  ["21.7.0", false],
  ["22.11.0", false],
  ["22.12.0", true],
  ["24.0.0", true],
])("Node.js %s: %s", (version, supported) => {
  expect(isNodeSupported(version)).toBe(supported);
});

test("the test command takes one part and patterns, and says so otherwise", () => {
  expect(readArguments([])).toEqual({ only: undefined, patterns: [] });
  expect(readArguments(["--only", "e2e", "bench"])).toEqual({ only: "e2e", patterns: ["bench"] });
  expect(() => readArguments(["bench"])).toThrow(Refusal);
  expect(() => readArguments(["--only", "everything"])).toThrow(Refusal);
});

const machine = { os: "linux", cpu: "x64", libc: "glibc" };
const compiled = { version: "1.0.0", optional: true, os: ["linux"], cpu: ["x64"], libc: ["glibc"] };

test.each([
  ["nothing is wanted", {}, {}, undefined],
  [
    "the same version is there",
    { "node_modules/a": { version: "1.0.0" } },
    { "node_modules/a": { version: "1.0.0" } },
    undefined,
  ],
  ["it is missing", { "node_modules/a": { version: "1.0.0" } }, {}, "node_modules/a"],
  [
    "another version is there",
    { "node_modules/a": { version: "1.0.0" } },
    { "node_modules/a": { version: "1.1.0" } },
    "node_modules/a",
  ],
  ["compiled parts for this machine are missing", { "node_modules/a": compiled }, {}, "node_modules/a"],
  ["compiled parts for another machine are missing", { "node_modules/a": { ...compiled, cpu: ["arm64"] } }, {}, undefined],
  ["compiled parts for another C library are missing", { "node_modules/a": { ...compiled, libc: ["musl"] } }, {}, undefined],
  [
    "something optional without compiled parts is missing",
    { "node_modules/a": { version: "1.0.0", optional: true } },
    {},
    undefined,
  ],
  [
    "a folder of the project itself is linked",
    { "stubs/empty": { version: "1.0.0" }, "node_modules/b": { link: true } },
    {},
    undefined,
  ],
])("packages, when %s", (_, locked, installed, difference) => {
  expect(firstDifference(locked, installed, machine)).toBe(difference);
});
