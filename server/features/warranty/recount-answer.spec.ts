import fc from 'fast-check';
import { CURVE_GROUPS } from '#shared/contracts/warranty';
import { addDays, addMonths } from '#shared/domain/calendar';
import {
  CHECK_ANSWERS,
  CHECKS,
  CLAIM_CAUSES,
  CLAIM_DECISIONS,
  ZONES,
} from '#shared/domain/vocabulary';
import type { SoldCar } from '../../../test/support/recount-cover';
import { outstandingByCohort, recountRisk } from '../../../test/support/recount-risk';
import { recountWarranty } from '../../../test/support/recount-warranty';
import {
  carAged,
  headOfficeOf,
  ROT_BRANCHES,
  ROT_PLACES,
  type RotBranch,
} from '../../../test/support/rot-store';
import type { SmallStore } from '../../../test/support/small-store';
import {
  makeWarrantyStore,
  openClaim,
  SOLD_MONTHS,
  writeClaim,
  type SentClaim,
  type SoldPackage,
} from '../../../test/support/warranty-store';
import { answerWarranty } from './answer-warranty';
import { warrantyRiskRows } from './risk-rows';

let small: SmallStore;
beforeAll(async () => (small = await makeWarrantyStore()), 30_000);
afterAll(() => small.close());

let run = 0;

/** Sends the cars with their claims, some corrected, some void afterwards; what of it counts. */
async function send(cars: readonly DrawnCar[]): Promise<SoldCar[]> {
  run += 1;
  const sold = cars.map(({ branch, day, years, finish: _, claims, ...rest }, n): SoldCar => {
    const ref = `${run}-${n}`;
    const { ml, bodyType, ...over } = rest;
    const { vehicle, ...job } = carAged(day, years, {
      ...over,
      products: [{ product: 'CW1', ml }],
    });
    const sent = { ...job, vehicle: { ...vehicle, bodyType } };
    const made = claims.map((claim) => claimOf(ref, day, rest.package, claim));
    return { branch, region: ROT_PLACES[branch], job: sent, claims: made };
  });
  await small.store.queue.write(() => {
    sold.forEach(({ branch, job, claims }, n) => {
      const ref = `${run}-${n}`;
      const isCorrected = cars[n]!.finish === 'corrected';
      if (isCorrected) small.write(branch, ref, carAged(addDays(job.completedOn, -1), 3));
      small.write(branch, ref, job);
      claims.forEach((claim, at) => {
        const first = openClaim(ref, job.completedOn, { costCents: 7, cause: 'damage' });
        if (isCorrected) writeClaim(small, branch, `${ref}/${at}`, first);
        writeClaim(small, branch, `${ref}/${at}`, claim);
      });
    });
  });
  for (const [n, { branch, finish }] of cars.entries()) {
    if (finish === 'voided') await small.voidJob(branch, `${run}-${n}`);
  }
  return sold.filter((_, n) => cars[n]!.finish !== 'voided');
}

/** Takes everything away again, so that the next network begins with nothing. */
async function clear(cars: readonly DrawnCar[]): Promise<void> {
  for (const [n, { branch }] of cars.entries()) await small.voidJob(branch, `${run}-${n}`);
}

describe('answerWarranty and warrantyRiskRows', () => {
  it('given any cars and claims, are what a recount day by day comes to', async () => {
    await fc.assert(
      fc.asyncProperty(CARS, ASKED, async (cars, drawn) => {
        const { grant, branches, packages, bodyTypes, from, length, day, ...curves } = drawn;
        const counted = await send(cars);
        const asOf = typeof day === 'string' ? day : dayOf(counted, day);
        const reach = grant === 'head_office' ? headOfficeOf(small) : small.scope(...grant);
        const scope = branches ? reach.narrow({ branch: branches }) : reach;
        const to = length === undefined ? undefined : addDays(from ?? asOf, length);
        const packageIds = packages?.map((code) => small.store.state.package(code)!.id);
        const question = { asOf, from, to, filters: { packageIds, bodyTypes } };
        const network = counted.filter(
          ({ job }) =>
            (from ?? '') <= job.completedOn &&
            job.completedOn <= (to ?? '9999') &&
            (packages?.includes(job.package as 'full') ?? true) &&
            (bodyTypes?.includes(job.vehicle.bodyType as 'van') ?? true),
        );
        const answer = answerWarranty(
          small.store.scoped(scope),
          { ...question, ...curves },
          small.store.reference(scope),
        );
        const asked = { asOf, from, to, ...curves, scope: scope.echo() };
        const whole = grant === 'head_office' ? 'network' : grant;
        expect(answer).toEqual(nearly(recountWarranty(network, { ...asked, reach: whole })));
        const office = headOfficeOf(small);
        const rows = warrantyRiskRows(
          small.store.scoped(office),
          { ...question, branches },
          small.store.reference(office),
        );
        expect(rows).toEqual(nearly(recountRisk(network, asOf, branches)));
        if (!branches) {
          for (const [cohort, cents] of outstandingByCohort(network, asOf)) {
            const told = rows.filter((row) => row.cohort === cohort);
            expect(told.reduce((sum, row) => sum + row.outstandingCents!, 0)).toBe(cents);
          }
        }
        await clear(cars);
      }),
      { numRuns: 40 },
    );
  }, 120_000);
});

/** One of the days on which something turns for some car or claim. */
function dayOf(cars: readonly SoldCar[], pick: number): string {
  const days = cars.flatMap(({ job: { completedOn }, claims }) => [
    ...[completedOn, addMonths(completedOn, 24), addMonths(completedOn, 36)],
    ...claims.flatMap(({ madeOn, decidedOn, paidOn }) => [madeOn, decidedOn, paidOn]),
  ]);
  const told = days.flatMap((day) => day ?? []).sort();
  return told[pick % told.length] ?? '2023-01-01';
}

/** Numbers that are not whole may differ in their last digits by the order in which they were added up. */
function nearly<Value>(value: Value): Value {
  if (typeof value === 'number' && !Number.isInteger(value)) {
    return expect.closeTo(value, 9) as Value;
  }
  if (Array.isArray(value)) return value.map(nearly) as Value;
  if (typeof value !== 'object' || value === null || 'asymmetricMatch' in value) return value;
  return Object.fromEntries(Object.entries(value).map(([key, one]) => [key, nearly(one)])) as Value;
}

interface DrawnClaim {
  /** Days after completion, or after the last day under cover. */
  days: number;
  from: 'completion' | 'end';
  decision: SentClaim['decision'];
  decidedAfter: number | undefined;
  /** Days after it was made, or the end of the half-year. */
  paidAfter: number | 'half-year' | undefined;
  costCents: number;
  zone: SentClaim['zone'];
  cause: SentClaim['cause'];
  proposed: 'refused' | undefined;
}

function paidOnOf(madeOn: string, after: number | 'half-year'): string {
  if (after !== 'half-year') return addDays(madeOn, after);
  return `${madeOn.slice(0, 4)}-${madeOn.slice(5, 7) < '07' ? '06-30' : '12-31'}`;
}

function claimOf(
  jobRef: string,
  completedOn: string,
  sold: SoldPackage,
  drawn: DrawnClaim,
): SentClaim {
  const { days, from, decidedAfter, paidAfter, proposed, ...said } = drawn;
  const begin = from === 'end' ? addMonths(completedOn, SOLD_MONTHS[sold]) : completedOn;
  const made = addDays(begin, days);
  const madeOn = made < completedOn ? completedOn : made;
  const isOpen = said.decision === 'open';
  return {
    ...{ jobRef, madeOn, ...said },
    ...(isOpen && proposed && { proposed }),
    ...(!isOpen && decidedAfter !== undefined && { decidedOn: addDays(madeOn, decidedAfter) }),
    ...(!isOpen && paidAfter !== undefined && { paidOn: paidOnOf(madeOn, paidAfter) }),
  };
}

const CLAIM: fc.Arbitrary<DrawnClaim> = fc
  .record({
    at: fc.oneof(
      fc.record({
        from: fc.constant('completion' as const),
        days: fc.integer({ min: 0, max: 1900 }),
      }),
      // About the last day under cover.
      fc.record({ from: fc.constant('end' as const), days: fc.integer({ min: -1, max: 1 }) }),
    ),
    decision: fc.constantFrom(...CLAIM_DECISIONS),
    decidedAfter: fc.option(fc.integer({ min: 0, max: 400 }), { nil: undefined }),
    paidAfter: fc.option(
      fc.oneof(fc.integer({ min: 0, max: 400 }), fc.constant('half-year' as const)),
      { nil: undefined },
    ),
    costCents: fc.integer({ min: 0, max: 90_000 }),
    zone: fc.constantFrom(...ZONES),
    cause: fc.constantFrom(...CLAIM_CAUSES),
    proposed: fc.constantFrom('refused' as const, undefined),
  })
  .map(({ at, ...claim }) => ({ ...claim, ...at }));

/** Days of four years, the last of a month more often than others. */
const DAY = fc.oneof(
  fc.integer({ min: 0, max: 1460 }).map((days) => addDays('2019-06-01', days)),
  fc.integer({ min: 0, max: 47 }).map((months) => addDays(addMonths('2019-07-01', months), -1)),
);

const CHECKED = fc.record(
  Object.fromEntries(CHECKS.map((check) => [check, fc.constantFrom(...CHECK_ANSWERS)])) as Record<
    (typeof CHECKS)[number],
    fc.Arbitrary<(typeof CHECK_ANSWERS)[number]>
  >,
  { requiredKeys: [] },
);

const CAR = fc.record({
  branch: fc.constantFrom<RotBranch>(...ROT_BRANCHES),
  day: DAY,
  years: fc.constantFrom(1, 4, 5, 9, 14, 31),
  package: fc.constantFrom<SoldPackage>('full', 'full', 'cavity', 'long', 'bare'),
  bodyType: fc.constantFrom('van' as const, 'van' as const, 'suv' as const),
  ml: fc.constantFrom(2799, 2800, 4000),
  checks: CHECKED,
  claims: fc.oneof(fc.constant<DrawnClaim[]>([]), fc.array(CLAIM, { minLength: 1, maxLength: 3 })),
  finish: fc.constantFrom('kept', 'kept', 'kept', 'corrected', 'voided'),
});
type DrawnCar = typeof CAR extends fc.Arbitrary<infer Car> ? Car : never;

const CARS = fc.oneof(
  { weight: 1, arbitrary: fc.array(CAR, { maxLength: 8 }) },
  { weight: 4, arbitrary: fc.array(CAR, { minLength: 40, maxLength: 80, size: 'max' }) },
);

/** Most questions narrow nothing, so that much is counted. */
function seldom<Value>(arbitrary: fc.Arbitrary<Value>): fc.Arbitrary<Value | undefined> {
  return fc.oneof({ weight: 4, arbitrary: fc.constant(undefined) }, { weight: 1, arbitrary });
}

/** The last days of half-years and those before them, the first cars' own, a leap day. */
const HALF_YEARS = [
  ...['2019-06-20', '2019-12-20', '2022-06-29', '2022-06-30', '2022-12-30', '2022-12-31'],
  '2024-02-29',
];

const ASKED = fc.record({
  grant: fc.constantFrom<'head_office' | RotBranch[]>(
    'head_office',
    'head_office',
    ['AAA'],
    ['AAA', 'BBB', 'CCC'],
    ['AAA', 'BBB', 'CCC', 'DDD', 'EEE'],
    ['DDD', 'EEE', 'FFF', 'GGG'],
  ),
  branches: seldom(fc.subarray(ROT_BRANCHES)),
  packages: fc.constantFrom<SoldPackage[] | undefined>(undefined, undefined, ['full', 'long']),
  bodyTypes: fc.constantFrom<('van' | 'suv')[] | undefined>(undefined, undefined, ['van']),
  from: seldom(DAY),
  length: seldom(fc.integer({ min: 0, max: 900 })),
  day: fc.oneof(
    { weight: 4, arbitrary: fc.nat() },
    fc.integer({ min: 0, max: 2400 }).map((days) => addDays('2019-06-01', days)),
    fc.constantFrom(...HALF_YEARS),
  ),
  groupBy: fc.constantFrom(...CURVE_GROUPS),
  groups: fc.constantFrom<string[] | undefined>(undefined, undefined, ['full', 'AAA', '5-9', 'no']),
});
