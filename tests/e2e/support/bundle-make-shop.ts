/** Runs once before the browser tests: bundles the program that makes shops. */
import path from "node:path";
import { build } from "esbuild";

const root = path.resolve(import.meta.dirname, "../../..");

export default async function bundleMakeShop(): Promise<void> {
  await build({
    absWorkingDir: root,
    entryPoints: ["tests/e2e/support/make-shop.ts"],
    outfile: ".data/build/make-shop.mjs",
    bundle: true,
    platform: "node",
    format: "esm",
    target: "node20",
    packages: "external",
    alias: { "@": root, "server-only": path.join(root, "node_modules/server-only/empty.js") },
    logLevel: "warning",
  });
}
