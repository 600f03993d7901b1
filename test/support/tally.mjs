/**
 * Adds up what the steps of a test run gave. A step without a jest report is one check; one with a report counts its tests,
 * and counts as one failure more when it failed in a way that its tests do not show. A test skipped or left to do, and a
 * report without tests, count as failed: nothing is left out silently.
 * @param {{ name: string, code: number, report?: object | null }[]} steps `report: null`: there should have been one
 * @returns {{ passed: number, failed: number, reasons: string[] }}
 */
export function tally(steps) {
  const sum = { passed: 0, failed: 0, reasons: [] };
  for (const step of steps) {
    const { passed, failed, reasons } = tallyStep(step);
    sum.passed += passed;
    sum.failed += failed;
    sum.reasons.push(...reasons);
  }
  return sum;
}

function tallyStep({ name, code, report }) {
  if (report === undefined) {
    return code === 0
      ? { passed: 1, failed: 0, reasons: [] }
      : { passed: 0, failed: 1, reasons: [`${name} failed.`] };
  }
  if (report === null) return { passed: 0, failed: 1, reasons: [`${name} left no report.`] };
  const reasons = [
    ...testsOf(report, 'failed').map((test) => `${name}: ${test}`),
    ...report.testResults
      .filter((file) => file.status === 'failed' && !hasFailedTest(file))
      .map((file) => `${name}: ${file.name} could not run.`),
    ...['pending', 'skipped', 'disabled', 'todo'].flatMap((status) =>
      testsOf(report, status).map((test) => `${name}: "${test}" was left out (${status}).`),
    ),
  ];
  if (report.numTotalTests === 0) reasons.push(`${name} found no test.`);
  if (reasons.length === 0 && code !== 0) reasons.push(`${name} ended with code ${code}.`);
  return { passed: report.numPassedTests, failed: reasons.length, reasons };
}

function testsOf(report, status) {
  return report.testResults.flatMap((file) =>
    file.assertionResults.filter((test) => test.status === status).map((test) => test.fullName),
  );
}

function hasFailedTest(file) {
  return file.assertionResults.some((test) => test.status === 'failed');
}
