import fc from 'fast-check';
import { addDays } from '#shared/domain/calendar';
import { BRANCH_MEASURES, CLAIM_CAUSES, CLAIM_DECISIONS, STAGES } from '#shared/domain/vocabulary';
import { recountBranches, RECOUNTED_NORMS, stepKeys } from '../../../test/support/recount-branches';
import type { SoldCar } from '../../../test/support/recount-cover';
import {
  carAged,
  found,
  headOfficeOf,
  ROT_BRANCHES,
  ROT_PLACES,
  type RotBranch,
  type SentFinding,
} from '../../../test/support/rot-store';
import type { SmallStore } from '../../../test/support/small-store';
import { makeWarrantyStore, openClaim, writeClaim } from '../../../test/support/warranty-store';
import { answerBranches } from './answer-branches';
import { answerSideBySide } from './answer-side-by-side';

let small: SmallStore;
beforeAll(async () => {
  small = await makeWarrantyStore();
  const lines = Object.entries(RECOUNTED_NORMS['cavity/suv']!);
  await small.change({
    ...{ kind: 'norm', package: 'cavity', bodyType: 'suv' },
    lines: lines.map(([product, ml]) => ({ product, ml })),
  });
}, 30_000);
afterAll(() => small.close());

const DAYS = 10;

describe('answerBranches and answerSideBySide', () => {
  it('given any cars, bills and claims, are what a recount car by car comes to, in all five measures', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(CARS, ASKED, async (cars, asked) => {
        const { grant, branches, packages, bodies, after } = asked;
        const from = addDays('2020-01-06', 2 * DAYS * (run += 1));
        const to = addDays(from, DAYS - 1);
        const today = addDays(to, after);
        const sent = cars.map((car, n): SoldCar & { ref: string } => {
          const { branch, day, years, claims, bodyType, finish: _, ...over } = car;
          const ref = `${run}-${n}`;
          const job = carAged(addDays(from, day), years, over);
          job.vehicle = { ...job.vehicle, bodyType };
          const made = claims.map(({ days, ...claim }) =>
            openClaim(ref, addDays(job.completedOn, days), {
              ...claim,
              ...(claim.decision !== 'open' && { decidedOn: addDays(job.completedOn, days + 30) }),
            }),
          );
          return { branch, region: ROT_PLACES[branch], job, claims: made, ref };
        });
        await small.store.queue.write(() => {
          sent.forEach(({ branch, ref, job, claims }, n) => {
            if (cars[n]!.finish === 'corrected') small.write(branch, ref, carAged(from, 3));
            small.write(branch, ref, job);
            claims.forEach((claim, at) => writeClaim(small, branch, `${ref}/${at}`, claim));
          });
        });
        for (const [n, { branch, finish }] of cars.entries()) {
          if (finish === 'voided') await small.voidJob(branch, `${run}-${n}`);
        }
        const network = sent.filter(
          ({ job }, n) =>
            cars[n]!.finish !== 'voided' &&
            job.completedOn <= to &&
            (packages?.includes(job.package as 'full') ?? true) &&
            (bodies?.includes(job.vehicle.bodyType as 'van') ?? true),
        );
        const reach = grant === 'head_office' ? headOfficeOf(small) : small.scope(...grant);
        const scope = branches ? reach.narrow({ branch: branches }) : reach;
        const packageIds = packages?.map((code) => small.store.state.package(code)!.id);
        const db = small.store.scoped(scope);
        const own = network.filter(({ branch }) => scope.branch(branch));
        for (const measure of BRANCH_MEASURES) {
          const question = {
            ...{ measure, period: { from, to }, today },
            filters: { packageIds, bodyTypes: bodies },
          };
          const { received: _, ...told } = answerBranches(
            db,
            question,
            small.store.reference(scope),
          );
          const { steps, ...recount } = recountBranches(network, {
            ...{ measure, scope: scope.echo().branches, today },
            reach: grant === 'head_office' ? 'network' : grant,
          });
          expect(told).toEqual({
            ...{ period: { from, to }, scope: scope.echo(), jobs: own.length, measure },
            withoutCost: measure === 'margin' ? own.filter(isUncosted).length : 0,
            missingCosts: expect.any(Array) as [],
            ...recount,
          });
          const beside = answerSideBySide(db, question, small.store.reference(scope));
          expect(beside.branches.map(({ branch }) => branch)).toEqual(
            recount.branches.map(({ branch }) => branch),
          );
          for (const { branch, steps: mine, value } of beside.branches) {
            const wanted = steps.get(branch);
            expect(mine === null).toBe(wanted === null);
            if (!mine || !wanted) continue;
            expect(mine.map(({ key }) => key)).toEqual(['mix', ...stepKeys(measure)]);
            for (const step of mine) {
              expect(step.value).toBeCloseTo(wanted.get(step.key) ?? 0, 9);
            }
            const end = mine.reduce((sum, step) => sum + step.value, beside.network!);
            expect(end).toBeCloseTo(value!, 9);
          }
        }
      }),
      { numRuns: 30 },
    );
  }, 180_000);
});

function isUncosted({ branch, job }: SoldCar): boolean {
  const uses = (job.products ?? []).some(({ product }) => product === 'UW1');
  return uses || !['AAA', 'BBB', 'CCC'].includes(branch);
}

const MINUTES = fc
  .array(fc.integer({ min: 0, max: 300 }), { minLength: STAGES.length, maxLength: STAGES.length })
  .map((minutes) => Object.fromEntries(STAGES.map((stage, at) => [stage, minutes[at]])));

const CARS = fc.array(
  fc.record({
    branch: fc.constantFrom(...ROT_BRANCHES, 'AAA' as const, 'AAA' as const, 'BBB' as const),
    years: fc.constantFrom(1, 4, 5, 12, 19, 31),
    day: fc.integer({ min: 0, max: DAYS }),
    package: fc.constantFrom('full', 'full', 'cavity', 'bare'),
    bodyType: fc.constantFrom('van' as const, 'suv' as const),
    estimate: fc.option(fc.record({ priceCents: fc.nat(99_999), stages: MINUTES }), {
      nil: undefined,
    }),
    actual: fc.record({ stages: MINUTES }),
    products: fc.subarray([
      { product: 'CW1', ml: 3333 },
      { product: 'CW1', ml: 17 },
      { product: 'UW1', ml: 900 },
    ]),
    boughtInCents: fc.nat(9_999),
    invoice: fc.option(fc.record({ totalCents: fc.nat(150_000) }), { nil: undefined }),
    findings: fc.constantFrom<SentFinding[]>(
      [],
      [],
      [found('floor')],
      [found('floor', { seenAs: 'surface' })],
    ),
    claims: fc.array(
      fc.record({
        days: fc.constantFrom(0, 1, 100, 365, 731, 1095, 1096, 1097),
        cause: fc.constantFrom(...CLAIM_CAUSES),
        decision: fc.constantFrom(...CLAIM_DECISIONS),
      }),
      { maxLength: 2 },
    ),
    finish: fc.constantFrom('kept', 'kept', 'kept', 'corrected', 'voided'),
  }),
  { minLength: 0, maxLength: 60, size: 'max' },
);

const ASKED = fc.record({
  grant: fc.constantFrom<'head_office' | RotBranch[]>(
    'head_office',
    ['AAA'],
    ['AAA', 'BBB', 'CCC'],
    ['AAA', 'BBB', 'CCC', 'DDD', 'EEE'],
    ['DDD', 'EEE', 'FFF', 'GGG'],
  ),
  branches: fc.option(fc.subarray(ROT_BRANCHES), { nil: undefined }),
  packages: fc.constantFrom<('full' | 'cavity')[] | undefined>(undefined, undefined, ['full']),
  bodies: fc.constantFrom<('van' | 'suv')[] | undefined>(undefined, undefined, ['van']),
  after: fc.constantFrom(-3, 0, 1, 100, 740, 1200),
});
