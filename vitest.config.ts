import { defineConfig } from "vitest/config";

export default defineConfig({
  test: {
    projects: [
      { test: { name: "domain", include: ["packages/domain/src/**/*.test.ts"], testTimeout: 60_000 } },
      { test: { name: "client", include: ["packages/client/src/**/*.test.ts"] } },
      { test: { name: "web", include: ["apps/web/src/**/*.test.ts"], css: true } },
      { test: { name: "cli", include: ["apps/cli/src/**/*.test.ts"], testTimeout: 60_000 } },
      { test: { name: "seeds", include: ["seeds/**/*.test.ts"], testTimeout: 60_000 } },
      {
        test: {
          name: "api",
          include: ["apps/api/src/**/*.test.ts", "migrations/*.test.ts"],
          globalSetup: "apps/api/src/testing/build-worker.ts",
          testTimeout: 60_000,
        },
      },
      {
        test: { name: "conformance", include: ["tests/conformance/**/*.test.ts"], testTimeout: 120_000 },
      },
      { test: { name: "crash", include: ["tests/crash/**/*.test.ts"], testTimeout: 300_000 } },
      {
        test: {
          name: "browser",
          include: ["tests/browser/**/*.test.ts"],
          globalSetup: "tests/browser/demo-shop.ts",
          testTimeout: 120_000,
          hookTimeout: 120_000,
          fileParallelism: false,
        },
      },
    ],
  },
});
