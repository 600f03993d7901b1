import { comeBackMark } from '#shared/contracts/come-back';
import { addDays } from '#shared/domain/calendar';
import { breaksOfMark } from '#shared/domain/come-back-rules';
import { referenced } from '#shared/domain/normalise-job';
import { historyOf } from './branch-history';
import { BRANCHES } from './branches';
import { newestContent, type BranchHistory, type DemoComeBackMark } from './demo-network';
import { DEMO_SEED } from './generate-network';

const TODAY = '2026-02-02';
const branches = BRANCHES.filter(({ code }) => ['HAV', 'BRI', 'HEI'].includes(code)).map((branch) =>
  historyOf(branch, DEMO_SEED, TODAY),
);
const [havnsund] = branches.filter(({ branchCode }) => branchCode === 'HAV') as [BranchHistory];

/** Everything left on the cars of a branch, with the marks set on it, oldest first. */
function leftOf({ jobs, comeBackMarks }: BranchHistory) {
  const marks = new Map<string, DemoComeBackMark[]>();
  for (const mark of comeBackMarks) {
    const name = `${mark.jobRef} ${mark.ref}`;
    marks.set(name, [...(marks.get(name) ?? []), mark]);
  }
  return jobs
    .filter(({ voided }) => !voided)
    .flatMap((job) =>
      referenced(newestContent(job).findings ?? [])
        .filter(({ action }) => action === 'deferred' || action === 'declined')
        .map((finding) => ({
          job,
          ...finding,
          ...newestContent(job),
          marks: marks.get(`${job.jobRef} ${finding.ref}`) ?? [],
        })),
    );
}

const statusOf = ({ marks }: { marks: DemoComeBackMark[] }) => marks.at(-1)?.mark.status ?? 'open';

describe('drawComeBackMarks', () => {
  test('drawn twice, is the same', () => {
    const branch = BRANCHES.find(({ code }) => code === 'HAV')!;
    expect(historyOf(branch, DEMO_SEED, TODAY).comeBackMarks).toEqual(havnsund.comeBackMarks);
  });

  test('held to the rules of a mark, passes them all, after its job arrived and before today', () => {
    for (const branch of branches) {
      const left = leftOf(branch);
      expect(left.flatMap(({ marks }) => marks)).toHaveLength(branch.comeBackMarks.length);
      for (const { job, completedOn, marks } of left) {
        for (const { mark, changedAt } of marks) {
          expect(comeBackMark.parse(mark)).toEqual(mark);
          expect(breaksOfMark(mark, completedOn, changedAt.slice(0, 10))).toEqual([]);
          expect(changedAt > job.receivedAt.slice(0, 10) && changedAt < TODAY).toBe(true);
        }
        const times = marks.map(({ changedAt }) => changedAt);
        expect(times).toEqual([...new Set(times)].sort());
      }
    }
  });

  test('of the last year’s load-bearing findings, has nearly every owner told in writing, not all', () => {
    const dangerous = branches
      .flatMap(leftOf)
      .filter((one) => one.structural && one.completedOn > addDays(TODAY, -365));
    const told = dangerous.filter(({ marks }) => marks.some(({ mark }) => mark.ownerToldOn));
    expect(dangerous.length).toBeGreaterThan(30);
    expect(told.length / dangerous.length).toBeGreaterThan(0.75);
    expect(told.length).toBeLessThan(dangerous.length);
  });

  test('of what is older than 400 days, has most closed; of the last half year, has most open', () => {
    const left = branches.flatMap(leftOf);
    const shareOpen = (some: typeof left) =>
      some.filter((one) => statusOf(one) !== 'done' && statusOf(one) !== 'gone').length /
      some.length;
    const unmended = left.filter(({ vehicle, completedOn, zone, side }) =>
      isUnmended(vehicle.key, completedOn, zone, side),
    );
    const old = unmended.filter(({ completedOn }) => completedOn < addDays(TODAY, -400));
    const young = left.filter(({ completedOn }) => completedOn >= addDays(TODAY, -180));
    expect(old.length).toBeGreaterThan(200);
    expect(shareOpen(old)).toBeLessThan(0.2);
    expect(young.length).toBeGreaterThan(20);
    expect(shareOpen(young)).toBeGreaterThan(0.6);
  });

  test('for a booking, has a day to come', () => {
    const booked = branches.flatMap(leftOf).filter((one) => statusOf(one) === 'booked');
    const open = booked.filter(({ vehicle, completedOn, zone, side }) =>
      isUnmended(vehicle.key, completedOn, zone, side),
    );
    expect(open.length).toBeGreaterThan(3);
    for (const { marks } of open) expect(marks.at(-1)!.mark.dueOn! > TODAY).toBe(true);
  });
});

/** Whether no later job of the car mended the place. */
function isUnmended(key: string | undefined, on: string, zone: string, side: string): boolean {
  return !MENDED.some(
    (one) => one.key === key && one.completedOn > on && one.zone === zone && one.side === side,
  );
}

const MENDED = branches.flatMap(({ jobs }) =>
  jobs
    .filter(({ voided }) => !voided)
    .flatMap((job) => {
      const { vehicle, completedOn, findings = [] } = newestContent(job);
      return findings
        .filter(({ action }) => action === 'treated' || action === 'patched')
        .map(({ zone, side }) => ({ key: vehicle.key, completedOn, zone, side }));
    }),
);
