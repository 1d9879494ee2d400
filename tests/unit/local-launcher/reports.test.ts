import { describe, expect, it } from "vitest";
import { addTallies, judge, lastLine, tallyCheck, tallyPlaywright, tallyVitest } from "@/tests/support/runner/reports";

describe("adding up", () => {
  it("counts Vitest's tests", () => {
    const report = { numPassedTests: 12, numFailedTests: 2, testResults: [{ status: "failed", assertionResults: [{}] }] };
    expect(tallyVitest(report)).toEqual({ passed: 12, failed: 2 });
  });

  it("counts a test file that could not be loaded as a failure", () => {
    const report = { numPassedTests: 12, numFailedTests: 0, testResults: [{ status: "failed", assertionResults: [] }] };
    expect(tallyVitest(report)).toEqual({ passed: 12, failed: 1 });
  });

  it("counts a browser test that passed only when repeated, and a fault outside of tests, as failures", () => {
    expect(tallyPlaywright({ stats: { expected: 5, unexpected: 1, flaky: 1 }, errors: [{}] })).toEqual({ passed: 5, failed: 3 });
  });

  it.each([
    ["all passed", 0, { passed: 3, failed: 0 }, 0],
    ["some failed", 1, { passed: 3, failed: 2 }, 2],
    ["it ended badly without saying where", 1, { passed: 3, failed: 0 }, 1],
    ["nothing ran", 0, { passed: 0, failed: 0 }, 1],
  ])("judges a runner when %s", (_, code, tally, failed) => expect(judge(code, tally).failed).toBe(failed));

  it("counts a check as one", () => {
    expect(tallyCheck(0)).toEqual({ passed: 1, failed: 0 });
    expect(tallyCheck(2)).toEqual({ passed: 0, failed: 1 });
  });

  it("ends with one line", () => {
    expect(lastLine(addTallies([{ passed: 3, failed: 0 }, { passed: 4, failed: 1 }]))).toBe("7 passed, 1 failed");
  });
});
