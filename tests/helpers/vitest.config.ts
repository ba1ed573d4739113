import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL("../..", import.meta.url));
const stub = fileURLToPath(new URL("./server-only.ts", import.meta.url));

const shared = {
  resolve: {
    alias: [
      { find: /^server-only$/, replacement: stub },
      { find: /^@\//, replacement: `${root}` },
    ],
  },
};

export default defineConfig({
  root,
  ...shared,
  test: {
    coverage: {
      provider: "v8",
      include: ["lib/calc/**/*.ts"],
      reporter: ["text-summary", "json-summary"],
      thresholds: { branches: 95, lines: 99 },
    },
    projects: [
      {
        ...shared,
        root,
        test: { name: "unit", include: ["tests/unit/**/*.test.ts"], environment: "node", testTimeout: 30_000 },
      },
      {
        ...shared,
        root,
        test: {
          name: "integration",
          include: ["tests/integration/**/*.test.{ts,tsx}"],
          environment: "node",
          testTimeout: 60_000,
          hookTimeout: 60_000,
        },
      },
      {
        ...shared,
        root,
        test: {
          name: "components",
          include: ["tests/components/**/*.test.tsx"],
          environment: "jsdom",
          setupFiles: [fileURLToPath(new URL("./components-setup.ts", import.meta.url))],
          testTimeout: 30_000,
        },
      },
    ],
  },
});
