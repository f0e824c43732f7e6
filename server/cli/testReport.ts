/** Reads how many tests passed and failed out of the test runners' JSON reports. */

export type Tally = { passed: number; failed: number };

/** Adds tallies up. */
export function sum(tallies: readonly Tally[]): Tally {
  return tallies.reduce((all, one) => ({ passed: all.passed + one.passed, failed: all.failed + one.failed }), { passed: 0, failed: 0 });
}

/**
 * The tally of one program that ran: `report` is the content of its JSON report, undefined when it wrote none. A program
 * that failed without a failed test in its report (a file that could not be loaded, a crash) counts as one failure, and
 * so does a test that was skipped or only passed on a second try: it has shown nothing.
 */
export function tallyOf(exitCode: number, report: string | undefined): Tally {
  const counted = report === undefined ? { passed: 0, failed: 0 } : count(JSON.parse(report) as Report);
  return exitCode !== 0 && counted.failed === 0 ? { ...counted, failed: 1 } : counted;
}

type Report = {
  /** Vitest */
  numPassedTests?: number;
  numTotalTests?: number;
  /** Playwright */
  stats?: { expected: number; unexpected: number; flaky: number; skipped: number };
};

function count(report: Report): Tally {
  if (report.stats !== undefined) {
    const { expected, unexpected, flaky, skipped } = report.stats;
    return { passed: expected, failed: unexpected + flaky + skipped };
  }
  const passed = report.numPassedTests ?? 0;
  return { passed, failed: (report.numTotalTests ?? 0) - passed };
}
