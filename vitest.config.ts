import { defineConfig } from "vitest/config";
import { fileURLToPath } from "node:url";

const root = fileURLToPath(new URL(".", import.meta.url));

export default defineConfig({
  resolve: {
    alias: [
      { find: /^@\//, replacement: root },
      // Next resolves this marker itself; outside Next it only throws.
      { find: /^server-only$/, replacement: `${root}tests/factories/server-only.ts` },
    ],
  },
  test: {
    environment: "node",
    include: ["tests/{unit,api,reference}/**/*.test.ts"],
    testTimeout: 30_000,
    hookTimeout: 60_000,
    maxWorkers: 2,
  },
});
