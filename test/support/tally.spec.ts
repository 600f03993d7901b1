import path from 'node:path';
import { askModule } from './ask-module';

interface Sum {
  passed: number;
  failed: number;
  reasons: string[];
}

const tally = (steps: readonly object[]): Sum =>
  askModule(path.join(__dirname, 'tally.mjs'), 'tally', [steps]) as Sum;

const file = (...statuses: string[]): object => ({
  name: 'a.spec.ts',
  status: statuses.includes('failed') || statuses.length === 0 ? 'failed' : 'passed',
  assertionResults: statuses.map((status, at) => ({ status, fullName: `test ${at + 1}` })),
});

const report = (...files: object[]): object => {
  const tests = files.flatMap(
    (one) => (one as { assertionResults: { status: string }[] }).assertionResults,
  );
  return {
    numTotalTests: tests.length,
    numPassedTests: tests.filter(({ status }) => status === 'passed').length,
    testResults: files,
  };
};

describe('tally', () => {
  it('given steps without a report, counts each as one check', () => {
    expect(
      tally([
        { name: 'lint', code: 0 },
        { name: 'types', code: 2 },
      ]),
    ).toEqual({
      passed: 1,
      failed: 1,
      reasons: ['types failed.'],
    });
  });

  it('given reports of several runs, adds up their tests', () => {
    const steps = [
      { name: 'unit', code: 0, report: report(file('passed', 'passed')) },
      { name: 'journeys', code: 1, report: report(file('passed', 'failed')) },
    ];
    expect(tally(steps)).toEqual({ passed: 3, failed: 1, reasons: ['journeys: test 2'] });
  });

  it('given a test left out, counts it as failed and names it', () => {
    const { passed, failed, reasons } = tally([
      { name: 'unit', code: 0, report: report(file('passed', 'pending', 'todo')) },
    ]);
    expect([passed, failed]).toEqual([1, 2]);
    expect(reasons.join()).toContain('test 2');
  });

  it('given a file that could not run beside one that passed, counts it as failed', () => {
    const steps = [{ name: 'unit', code: 1, report: report(file('passed'), file()) }];
    expect(tally(steps)).toMatchObject({ passed: 1, failed: 1 });
  });

  it('given a report without tests, fails', () => {
    expect(tally([{ name: 'unit', code: 0, report: report() }])).toMatchObject({ failed: 1 });
  });

  it('given no report where one was due, fails', () => {
    expect(tally([{ name: 'unit', code: 0, report: null }])).toMatchObject({ failed: 1 });
  });

  it('given a run that failed though all its tests passed, fails', () => {
    const steps = [{ name: 'unit', code: 1, report: report(file('passed')) }];
    expect(tally(steps)).toMatchObject({ passed: 1, failed: 1 });
  });
});
