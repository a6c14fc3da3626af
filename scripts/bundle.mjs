// Bundles the TypeScript programs that run outside Next.js into .data/build: those the commands start, and the worker threads.
// npm packages stay outside the bundles and are found in node_modules.
import fs from "node:fs";
import path from "node:path";
import { build } from "esbuild";
import { inData, inProject, root } from "./ground/project.mjs";

/** What the commands start; further ones, by their paths, where a command asks for them. */
const programs = ["migrate", "seed", "worker"].map((name) => `scripts/${name}.ts`).concat(process.argv.slice(2));

/** Every file of these rooms named …-worker.ts runs in a worker thread under its own name: pixel-worker.ts becomes pixel-worker.mjs. */
const threads = ["lib/server", "scripts/demo"]
  .flatMap((room) =>
    fs
      .readdirSync(inProject(room), { recursive: true, encoding: "utf8" })
      .filter((file) => file.endsWith("-worker.ts"))
      .map((file) => path.join(room, file)),
  )
  .sort();

const result = await build({
  absWorkingDir: root,
  entryPoints: Object.fromEntries([...programs, ...threads].map((file) => [path.basename(file, ".ts"), file])),
  outdir: inData("build"),
  outExtension: { ".js": ".mjs" },
  bundle: true,
  platform: "node",
  format: "esm",
  target: "node20",
  packages: "external",
  // "server-only" is a guard for Next.js' bundler; in plain Node.js it throws by design.
  alias: { "@": root, "server-only": inProject("node_modules", "server-only", "empty.js") },
  conditions: ["react-server"],
  sourcemap: "linked",
  write: false,
  logLevel: "warning",
}).catch((failure) => {
  // What stops esbuild it has printed by itself.
  if (!("errors" in failure)) throw failure;
  process.exit(1);
});

fs.mkdirSync(inData("build"), { recursive: true });
for (const { path: file, contents } of result.outputFiles) {
  // A server that is running may be about to load this very file: replace it whole, and only when it has changed.
  if (fs.existsSync(file) && fs.readFileSync(file).equals(contents)) continue;
  const draft = `${file}.${process.pid}`;
  fs.writeFileSync(draft, contents);
  fs.renameSync(draft, file);
}
