import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL(".", import.meta.url));

const alias = [
  { find: /^@\//, replacement: root },
  // Next resolves this marker itself; outside Next it only throws.
  { find: /^server-only$/, replacement: `${root}tests/factories/server-only.ts` },
];

const project = (name: string, more: object = {}) => ({
  resolve: { alias },
  test: { name, environment: "node" as const, include: [`tests/${name}/**/*.test.{ts,tsx}`], testTimeout: 30_000, hookTimeout: 60_000, ...more },
});

export default defineConfig({
  test: {
    maxWorkers: 2,
    projects: [
      project("unit"),
      project("reference", { testTimeout: 300_000 }),
      // One real server for all API tests; see the set-up file.
      project("api", { globalSetup: "tests/api/serve.ts", fileParallelism: false }),
    ],
  },
});
