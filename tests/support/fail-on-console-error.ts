import { format } from "node:util";
import { afterEach, beforeEach } from "vitest";

let printed: string[] = [];
let expected: RegExp[] = [];
const original = console.error;

/** Says that the running test will print an error matching the pattern; the test fails if it does not. */
export function expectConsoleError(pattern: RegExp): void {
  expected.push(pattern);
}

beforeEach(() => {
  printed = [];
  expected = [];
  console.error = (...parts: unknown[]) => {
    printed.push(format(...parts));
  };
});

afterEach(() => {
  console.error = original;
  const surprises = printed.filter((line) => !expected.some((pattern) => pattern.test(line)));
  const missing = expected.filter((pattern) => !printed.some((line) => pattern.test(line)));
  if (surprises.length > 0) throw new Error(`console.error was called:\n${surprises.join("\n")}`);
  if (missing.length > 0) throw new Error(`Expected on console.error, but never printed: ${missing.join(", ")}`);
});
