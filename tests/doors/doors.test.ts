/** The doors between rooms hold: every forbidden import is reported by lint, and no relative import slips out of its room. */
import { execFileSync } from "node:child_process";
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";

const root = path.resolve(import.meta.dirname, "../..");

/** A file of a room, and imports that it must not have. */
const forbidden: readonly (readonly [string, readonly string[]])[] = [
  [
    "app/planted/page.tsx",
    ["@/db/client", "@/lib/editor/document", "@/lib/sawmill/log", "@/tests/x", "@/lib/layout/piece", "fabric"],
  ],
  ["components/planted/planted.tsx", ["@/app/page", "@/lib/server/env", "@/db/client", "@/lib/layout/units/um", "fabric"]],
  ["lib/client/planted.ts", ["@/components/ui/button", "@/lib/server/env", "@/db/client", "@/lib/editor/document"]],
  ["lib/editor/planted.ts", ["react", "fabric", "@/components/ui/button", "@/lib/client/call", "@/lib/server/env"]],
  ["lib/editor/canvas/planted.ts", ["react", "@/components/ui/button", "@/lib/server/env"]],
  ["lib/words/planted.ts", ["@/lib/server/env", "@/lib/client/call", "@/components/ui/button", "@/db/client"]],
  ["lib/schemas/planted.ts", ["@/lib/client/call", "@/lib/server/env", "@/db/client", "@/lib/words/caution", "react"]],
  [
    "lib/server/planted.ts",
    ["@/components/ui/button", "@/lib/client/call", "@/app/page", "@/lib/sawmill/log", "@/lib/layout/units/um"],
  ],
  ["db/planted.ts", ["@/lib/server/env", "@/lib/client/call", "@/components/ui/button", "@/lib/words/caution"]],
  ["lib/sawmill/planted.ts", ["@/lib/server/env", "@/lib/schemas/board", "@/lib/layout/piece"]],
  ["lib/layout/planted.ts", ["zod", "react", "node:fs", "sharp", "drizzle-orm", "@/lib/schemas/board", "@/lib/layout"]],
  ["scripts/planted.ts", ["@/app/page", "@/components/ui/button", "@/tests/x"]],
];

const plants = forbidden.flatMap(([file, specifiers]) =>
  specifiers.map((specifier, index) => ({
    file: file.replace("planted.", `planted-${index}.`).replace("page.", `page-${index}.`),
    specifier,
  })),
);

describe("doors between rooms", () => {
  const copy = mkdtempSync(path.join(tmpdir(), "doors-"));
  let reported: Set<string>;

  beforeAll(() => {
    const config = JSON.parse(readFileSync(path.join(root, "biome.json"), "utf8"));
    writeFileSync(path.join(copy, "biome.json"), JSON.stringify({ ...config, vcs: { enabled: false } }));
    for (const { file, specifier } of plants) {
      mkdirSync(path.join(copy, path.dirname(file)), { recursive: true });
      // A type import: those count as well.
      writeFileSync(path.join(copy, file), `import type { Planted } from "${specifier}";\nexport type Seen = Planted;\n`);
    }
    reported = new Set(linesOfLint(copy));
  });
  afterAll(() => rmSync(copy, { recursive: true, force: true }));

  it.each(plants)("$file must not import $specifier", ({ file }) => {
    expect(reported).toContain(file);
  });

  it("lets the core be imported by its one door", () => {
    const file = "lib/server/sound.ts";
    writeFileSync(path.join(copy, file), 'import type { Um } from "@/lib/layout";\nexport type Seen = Um;\n');
    expect(linesOfLint(copy)).not.toContain(file);
  });

  it("keeps relative imports inside their room", () => {
    const leaks = sourceFiles().flatMap((file) =>
      relativeImports(file)
        .filter((specifier) => roomOf(path.join(path.dirname(file), specifier)) !== roomOf(file))
        .map((specifier) => `${file} imports ${specifier}`),
    );
    expect(leaks).toEqual([]);
  });
});

/** Files with a forbidden import, as lint reports them. */
function linesOfLint(folder: string): string[] {
  const biome = path.join(root, "node_modules/.bin/biome");
  const args = ["lint", "--only=style/noRestrictedImports", "--reporter=github", "--max-diagnostics=none", "."];
  const options = { cwd: folder, encoding: "utf8" as const, stdio: ["ignore", "pipe", "ignore"] as ["ignore", "pipe", "ignore"] };
  try {
    return filesIn(execFileSync(biome, args, options));
  } catch (error) {
    // Found violations: a non-zero end with the report on standard output.
    if (error instanceof Error && "stdout" in error && typeof error.stdout === "string") return filesIn(error.stdout);
    throw error;
  }
}

/** Paths come as the machine sees them; those of the copy are given relative to it. */
const filesIn = (report: string): string[] =>
  [...report.matchAll(/,file=([^,]+),/g)].map((match) => (match[1] ?? "").replace(/^.*?doors-[^/]+\//, "").replace(/^\.\//, ""));

const rooms = [
  "lib/layout",
  "lib/editor",
  "lib/schemas",
  "lib/words",
  "lib/client",
  "lib/server",
  "lib/sawmill",
  "app",
  "components",
  "db",
  "scripts",
  "tests",
];
const roomOf = (file: string): string | undefined => rooms.find((room) => file === room || file.startsWith(`${room}/`));

function sourceFiles(): string[] {
  return rooms
    .filter((room) => room !== "tests")
    .flatMap((room) =>
      readdirSync(path.join(root, room), { recursive: true, encoding: "utf8" }).map((file) => path.join(room, file)),
    )
    .filter((file) => /\.tsx?$/.test(file));
}

function relativeImports(file: string): string[] {
  const text = readFileSync(path.join(root, file), "utf8");
  return [...text.matchAll(/(?:from|import)\s*\(?\s*"(\.{1,2}\/[^"]+)"/g)].map((match) => match[1] ?? "");
}
