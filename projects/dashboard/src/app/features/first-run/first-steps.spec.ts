import { curlExample } from './curl-example';
import { firstOpen, firstSteps, type KnownSoFar, stepAfter } from './first-steps';
import { putJob } from '#shared/contracts/jobs';

const NOTHING: KnownSoFar = {
  feeSet: false,
  regions: 0,
  branches: 0,
  branchesWithRate: 0,
  products: 0,
  productsWithCost: 0,
  packages: 0,
  norms: 0,
  others: 0,
  jobs: 0,
};
const doneOf = (known: KnownSoFar): string[] =>
  firstSteps(known).flatMap(({ key, done }) => (done ? [key] : []));

describe('firstSteps', () => {
  it('an empty network, has nothing done and begins with the network', () => {
    expect(doneOf(NOTHING)).toEqual([]);
    expect(firstOpen(firstSteps(NOTHING))).toBe('network');
  });

  it('a branch without an hourly cost, is not done', () => {
    const known = { ...NOTHING, feeSet: true, regions: 1, branches: 1 };
    expect(doneOf(known)).toEqual(['network', 'region']);
    expect(firstOpen(firstSteps(known))).toBe('branch');
  });

  it('all but people, goes past what can wait to the first job', () => {
    const known = {
      ...NOTHING,
      ...{ feeSet: true, regions: 1, branches: 1, branchesWithRate: 1 },
      ...{ products: 2, productsWithCost: 1, packages: 1 },
    };
    expect(firstOpen(firstSteps(known))).toBe('job');
    expect(doneOf(known)).not.toContain('people');
  });

  it('each step, leads to the one after it, the last to none', () => {
    const steps = firstSteps(NOTHING);
    expect(stepAfter(steps, 'network')?.key).toBe('region');
    expect(stepAfter(steps, 'job')).toBeUndefined();
  });
});

describe('curlExample', () => {
  it('what it sends, read as a shell would, is a job that the contract takes', () => {
    const source = { branch: 'HAV', sold: 'full', product: 'CW1', day: '2026-02-01' };
    const command = curlExample({ origin: 'https://here.example', ...source });
    expect(command).toContain('"https://here.example/api/branches/HAV/jobs/first-1"');
    const body: unknown = JSON.parse(/-d '([\s\S]*)'$/.exec(command)![1]!);
    expect(putJob.body.safeParse(body).error).toBeUndefined();
  });
});
