import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL(".", import.meta.url));

export default defineConfig({
  resolve: {
    alias: [
      { find: /^@\//, replacement: root },
      { find: "server-only", replacement: `${root}tests/support/server-only.ts` },
    ],
  },
  test: {
    include: ["tests/**/*.test.ts"],
    setupFiles: ["tests/support/property-seed.ts"],
    // Property tests search; a loaded machine takes several times as long as an idle one.
    testTimeout: 60_000,
  },
});
