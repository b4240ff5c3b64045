import path from "node:path";
import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const root = path.dirname(fileURLToPath(import.meta.url));
const alias = {
  "@": root,
  // The real package throws outside a server bundle; tests are neither.
  "server-only": path.join(root, "tests/setup/server-only.ts"),
};

/** Database-backed folders share one throw-away MariaDB, each worker its own schema. */
export default defineConfig({
  resolve: { alias },
  test: {
    maxWorkers: 2,
    testTimeout: 20_000,
    hookTimeout: 60_000,
    projects: [
      {
        extends: true,
        test: {
          name: "pure",
          environment: "node",
          include: ["tests/{unit,reference,architecture,scripts}/**/*.test.ts"],
          setupFiles: ["tests/setup/console.ts"],
        },
      },
      {
        extends: true,
        test: {
          name: "components",
          environment: "jsdom",
          include: ["tests/components/**/*.test.tsx"],
          setupFiles: ["tests/setup/console.ts"],
        },
      },
      {
        extends: true,
        test: {
          name: "services",
          environment: "node",
          include: ["tests/{services,routes,storage}/**/*.test.ts"],
          setupFiles: ["tests/setup/services.ts"],
        },
      },
      {
        extends: true,
        test: {
          name: "journeys",
          environment: "node",
          include: ["tests/journeys/**/*.test.ts"],
          testTimeout: 120_000,
          hookTimeout: 120_000,
          // One browser at a time: the journeys share one portal and its two cores.
          fileParallelism: false,
        },
      },
    ],
  },
});
