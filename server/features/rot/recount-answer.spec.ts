import fc from 'fast-check';
import { addDays } from '#shared/domain/calendar';
import { ACTIONS, CONDITIONS, SIDES, ZONES } from '#shared/domain/vocabulary';
import { recountRot, type CarSent } from '../../../test/support/recount-rot';
import {
  carAged,
  found,
  headOfficeOf,
  makeRotStore,
  ROT_BRANCHES,
  ROT_PLACES,
  type RotBranch,
  type SentFinding,
} from '../../../test/support/rot-store';
import type { SmallStore } from '../../../test/support/small-store';
import { answerRot } from './answer-rot';

let small: SmallStore;
beforeAll(async () => (small = await makeRotStore()), 30_000);
afterAll(() => small.close());

describe('answerRot', () => {
  it('given any cars at all, is what a recount of the raw findings comes to', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(CARS, ASKED, async (cars, { grant, branches, packages, bodies }) => {
        const from = addDays('2020-01-06', 20 * (run += 1));
        const sent: CarSent[] = [];
        await small.store.queue.write(() => {
          cars.forEach(({ branch, years, months, day, finish, ...rest }, n) => {
            const on = addDays(from, day);
            const job = carAged(on, years, { package: rest.package, findings: rest.findings });
            const registered = addMonths(job.vehicle.firstRegistered, months);
            job.vehicle = { ...job.vehicle, ...rest.vehicle, firstRegistered: registered };
            const ref = `any-${run}-${n}`;
            if (finish === 'corrected')
              small.write(branch, ref, carAged(on, 0, { findings: [found('floor')] }));
            small.write(branch, ref, job);
            sent.push({ branch, region: ROT_PLACES[branch], ref, job, order: n });
          });
        });
        for (const [n, { branch, finish }] of cars.entries()) {
          if (finish === 'voided') await small.voidJob(branch, `any-${run}-${n}`);
        }
        const counted = sent.filter((_, n) => cars[n]!.finish !== 'voided');
        const reach = grant === 'head_office' ? headOfficeOf(small) : small.scope(...grant);
        const scope = branches ? reach.narrow({ branch: branches }) : reach;
        const ids = packages?.map((code) => small.store.state.package(code)!.id);
        const answer = answerRot(
          small.store.scoped(scope),
          {
            period: { from, to: addDays(from, 9) },
            filters: { packageIds: ids, bodyTypes: bodies },
          },
          small.store.reference(scope),
        );
        const { period: _, ...told } = answer;
        expect(told).toEqual(
          recountRot(
            counted.filter(
              ({ job }) =>
                job.completedOn <= addDays(from, 9) &&
                (packages?.includes(job.package as 'full') ?? true) &&
                (bodies?.includes(job.vehicle.bodyType as 'van') ?? true),
            ),
            { scope: scope.echo(), reach: grant === 'head_office' ? 'network' : grant },
          ),
        );
      }),
      { numRuns: 40 },
    );
  }, 60_000);
});

function addMonths(month: string, by: number): string {
  const count = Number(month.slice(0, 4)) * 12 + Number(month.slice(5)) - 1 + by;
  return `${Math.floor(count / 12)}-${String((count % 12) + 1).padStart(2, '0')}`;
}

const FINDING: fc.Arbitrary<SentFinding> = fc.record(
  {
    zone: fc.constantFrom(...ZONES),
    side: fc.constantFrom(...SIDES),
    seenAs: fc.constantFrom(...CONDITIONS),
    workedAs: fc.constantFrom(...CONDITIONS),
    structural: fc.boolean(),
    action: fc.constantFrom(...ACTIONS),
  },
  { requiredKeys: ['zone', 'side', 'seenAs', 'structural', 'action'] },
);

const CARS = fc.array(
  fc.record({
    branch: fc.constantFrom(...ROT_BRANCHES),
    years: fc.constantFrom(1, 4, 5, 9, 10, 14, 15, 19, 20, 31),
    // A month more or less, about the edge of a year.
    months: fc.constantFrom(-1, 0, 1),
    day: fc.integer({ min: 0, max: 10 }),
    package: fc.constantFrom('full', 'cavity'),
    vehicle: fc.record({
      make: fc.constantFrom('Vela', 'VELA', 'Aru'),
      model: fc.constantFrom('Ono', 'ono', 'Zet'),
      bodyType: fc.constantFrom('van', 'suv'),
    }),
    findings: fc.oneof(fc.constant<SentFinding[]>([]), fc.array(FINDING, { maxLength: 4 })),
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
});
