import { fileURLToPath } from "node:url";
import react from "@vitejs/plugin-react";
import { defineConfig } from "vitest/config";

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** "server-only" throws outside a React server build, so tests of queries and commands get an empty file instead. */
const resolve = { alias: { "@": here("./"), "server-only": here("./tests/support/empty.ts") } };

const failOnConsoleError = here("./tests/support/fail-on-console-error.ts");
const cleanDom = here("./tests/support/clean-dom.ts");
const requireDatabase = here("./tests/support/require-test-database.ts");

/** Pure code and screens run anywhere; "integration" and "access" need a MariaDB named by TEST_DATABASE_ADMIN_URL. */
export default defineConfig({
  test: {
    projects: [
      { resolve, test: { name: "unit", include: ["tests/unit/**/*.test.ts"], environment: "node", setupFiles: [failOnConsoleError] } },
      {
        resolve,
        plugins: [react()],
        test: { name: "dom", include: ["tests/unit/**/*.test.tsx"], environment: "happy-dom", setupFiles: [failOnConsoleError, cleanDom] },
      },
      { resolve, test: { name: "reference", include: ["tests/reference/**/*.test.ts"], environment: "node", setupFiles: [failOnConsoleError] } },
      {
        resolve,
        test: {
          name: "integration",
          include: ["tests/integration/**/*.test.ts"],
          environment: "node",
          globalSetup: [requireDatabase],
          setupFiles: [failOnConsoleError],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
      {
        resolve,
        test: {
          name: "access",
          include: ["tests/access/**/*.test.ts"],
          environment: "node",
          globalSetup: [requireDatabase],
          setupFiles: [failOnConsoleError],
          testTimeout: 30_000,
          hookTimeout: 60_000,
        },
      },
    ],
  },
});
