import { fileURLToPath } from "node:url";
import { defineConfig } from "vitest/config";

const here = (path: string) => fileURLToPath(new URL(path, import.meta.url));

/** The access tests once more, with policy and scope replaced by ones that let everybody in. They must fail; tests/access/off.test.ts sees to it. */
export default defineConfig({
  root: here("../../../"),
  resolve: {
    alias: [
      { find: "@/lib/access/policy", replacement: here("./policy.ts") },
      { find: "@/lib/access/scope", replacement: here("./scope.ts") },
      { find: "server-only", replacement: here("../empty.ts") },
      { find: "@", replacement: here("../../../") },
    ],
  },
  test: {
    name: "access-off",
    include: ["tests/access/access.test.ts"],
    environment: "node",
    testTimeout: 60_000,
    hookTimeout: 60_000,
  },
});
