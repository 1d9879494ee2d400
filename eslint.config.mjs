import { defineConfig, globalIgnores } from "eslint/config";
import nextVitals from "eslint-config-next/core-web-vitals";
import nextTypescript from "eslint-config-next/typescript";
import jsxA11y from "eslint-plugin-jsx-a11y";

const PROCESS_MODULES = ["child_process", "node:child_process"];

export default defineConfig([
  globalIgnores([".next*/**", ".data/**", ".test/**", "next-env.d.ts", "db/migrations/**"]),
  ...nextVitals,
  ...nextTypescript,
  {
    name: "towfolio/all",
    files: ["**/*.{ts,tsx,mjs}"],
    rules: {
      ...jsxA11y.flatConfigs.recommended.rules,
      eqeqeq: ["error", "always", { null: "ignore" }],
      // Cycles are held by tests/unit/boundaries, in a hundredth of the time of the rule import/no-cycle.
      "import/no-default-export": "error",
      "no-restricted-imports": ["error", { paths: PROCESS_MODULES.map((name) => ({ name, message: "Only lib/local, lib/uploads and tests start processes." })) }],
    },
  },
  {
    name: "towfolio/typescript",
    files: ["**/*.{ts,tsx}"],
    rules: {
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-non-null-assertion": "error",
      "@typescript-eslint/ban-ts-comment": ["error", { "ts-ignore": true, "ts-expect-error": true, "ts-nocheck": true }],
      "@typescript-eslint/no-unused-vars": ["error", { ignoreRestSiblings: true }],
      "@typescript-eslint/consistent-type-imports": ["error", { fixStyle: "inline-type-imports", prefer: "type-imports" }],
    },
  },
  {
    // Needs the types, so it costs seconds; a forgotten await in these folders can lose a write.
    name: "towfolio/promises",
    files: ["lib/**/*.{ts,tsx}", "app/**/*.{ts,tsx}", "db/**/*.ts", "components/**/*.{ts,tsx}", "tests/support/**/*.ts"],
    languageOptions: { parserOptions: { projectService: true, tsconfigRootDir: import.meta.dirname } },
    rules: {
      "@typescript-eslint/no-floating-promises": "error",
    },
  },
  {
    name: "towfolio/processes",
    files: ["lib/local/**", "lib/uploads/**", "tests/**"],
    rules: { "no-restricted-imports": "off" },
  },
  {
    name: "towfolio/default-exports",
    files: ["app/**", "**/*.config.{ts,mjs}", "proxy.ts"],
    rules: { "import/no-default-export": "off" },
  },
]);
