import { defineConfig } from "vitest/config";

const plain = {
  environment: "node" as const,
  setupFiles: ["test/support/no-console-errors.ts"],
  // Solving a whole table of films takes seconds on a busy machine; nothing here is timed.
  testTimeout: 60_000,
};

export default defineConfig({
  resolve: { tsconfigPaths: true },
  test: {
    projects: [
      {
        extends: true,
        test: { ...plain, name: "unit", include: ["{app,database,scripts}/**/*.test.ts"] },
      },
      {
        extends: true,
        test: { ...plain, name: "component", environment: "jsdom", include: ["app/**/*.test.tsx"] },
      },
      { extends: true, test: { ...plain, name: "reference", include: ["test/reference/**/*.test.ts"] } },
      {
        extends: true,
        test: {
          ...plain,
          name: "browser",
          include: ["test/e2e/**/*.test.ts"],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
