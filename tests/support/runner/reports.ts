/** What one runner found. */
export type Tally = { passed: number; failed: number };

type VitestReport = {
  numPassedTests: number;
  numFailedTests: number;
  testResults: { status: string; assertionResults: unknown[] }[];
};

type PlaywrightReport = {
  stats: { expected: number; unexpected: number; flaky: number };
  errors: unknown[];
};

/** Adds up a Vitest report. A file that could not even be loaded has no tests, and counts as one failure. */
export function tallyVitest(report: VitestReport): Tally {
  const unloaded = report.testResults.filter(({ status, assertionResults }) => status === "failed" && assertionResults.length === 0);
  return { passed: report.numPassedTests, failed: report.numFailedTests + unloaded.length };
}

/** Adds up a Playwright report. A test that passed only when repeated is not one to rely on, so it counts as a failure. */
export function tallyPlaywright({ stats, errors }: PlaywrightReport): Tally {
  return { passed: stats.expected, failed: stats.unexpected + stats.flaky + errors.length };
}

/** The tally of a step whose command ended with a code: a runner that ran nothing, or failed without saying where, has failed. */
export function judge(code: number, tally: Tally): Tally {
  const silent = tally.failed === 0 && (code !== 0 || tally.passed === 0);
  return silent ? { ...tally, failed: 1 } : tally;
}

/** The tally of a check that only says yes or no, such as types. */
export function tallyCheck(code: number): Tally {
  return code === 0 ? { passed: 1, failed: 0 } : { passed: 0, failed: 1 };
}

export function addTallies(tallies: Tally[]): Tally {
  return tallies.reduce((sum, { passed, failed }) => ({ passed: sum.passed + passed, failed: sum.failed + failed }), { passed: 0, failed: 0 });
}

/** The line that ends a run. */
export function lastLine({ passed, failed }: Tally): string {
  return `${passed} passed, ${failed} failed`;
}
