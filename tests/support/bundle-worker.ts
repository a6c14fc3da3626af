/**
 * Bundles the program of a worker thread as scripts/bundle.mjs does, so that tests run by themselves. Worked out anew only when a
 * source is newer; written whole, because other test files may be about to load it.
 */
import fs from "node:fs";
import path from "node:path";
import { build } from "esbuild";

const root = process.cwd();

/** Makes `.data/build/NAME.mjs` of a file whose name is NAME.ts; `sources` are the folders it is made from. */
export async function bundleWorker(file: string, sources: readonly string[]): Promise<void> {
  const bundle = path.join(root, ".data", "build", `${path.basename(file, ".ts")}.mjs`);
  if (fs.existsSync(bundle) && newest(sources.map((source) => path.join(root, source))) < fs.statSync(bundle).mtimeMs) return;
  const { outputFiles } = await build({
    absWorkingDir: root,
    entryPoints: [file],
    outfile: bundle,
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    packages: "external",
    alias: { "@": root, "server-only": path.join(root, "node_modules/server-only/empty.js") },
    conditions: ["react-server"],
    write: false,
    logLevel: "warning",
  });
  fs.mkdirSync(path.dirname(bundle), { recursive: true });
  const draft = `${bundle}.${process.pid}`;
  for (const { contents } of outputFiles) fs.writeFileSync(draft, contents);
  fs.renameSync(draft, bundle);
}

function newest(folders: readonly string[]): number {
  const times = folders.flatMap((folder) =>
    fs.readdirSync(folder, { recursive: true, encoding: "utf8" }).map((file) => fs.statSync(path.join(folder, file)).mtimeMs),
  );
  return Math.max(...times);
}

/** For tests that issue cut orders. */
export const bundlePlanWorker = () => bundleWorker("lib/server/orders/plan-worker.ts", ["lib/server/orders", "lib/layout"]);

/** For tests that print. */
export const bundlePrintWorker = () =>
  bundleWorker("lib/server/print/print-worker.ts", ["lib/server/print", "lib/layout", "lib/words", "lib/schemas"]);
