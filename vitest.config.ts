import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = fileURLToPath(new URL(".", import.meta.url));

export default defineConfig({
  resolve: { alias: { "@": root.replace(/\/$/, "") } },
  test: {
    projects: [
      { extends: true, test: { name: "engine", include: ["tests/engine/**/*.test.ts", "tests/reference/**/*.test.ts", "tests/units/**/*.test.ts"], setupFiles: ["tests/support/properties.ts"] } },
      {
        extends: true,
        test: {
          name: "app",
          include: ["tests/api/**/*.test.ts", "tests/portal/**/*.test.ts"],
          globalSetup: ["tests/support/runningApp.ts"],
          fileParallelism: false,
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
