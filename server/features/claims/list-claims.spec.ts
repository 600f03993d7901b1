import fc from 'fast-check';
import { acceptClaim } from '#db/accept-claim';
import { ClaimWriter } from '#db/claim-writer';
import type { ClaimSort } from '#db/queries/claim-list';
import { claimContent } from '#shared/contracts/claims';
import { addDays, addMonths } from '#shared/domain/calendar';
import { claimStanding } from '#shared/domain/claim-standing';
import { monthInService, warrantyEnd } from '#shared/domain/warranty-cover';
import { CLAIM_DECISIONS } from '#shared/domain/vocabulary';
import { unbilledJob } from '../../../test/support/kept-job';
import { RECEIPT, SmallStore } from '../../../test/support/small-store';
import { everyClaim, listClaims, type ClaimPage, type ClaimsAsked } from './list-claims';

const SORTS: readonly ClaimSort[] = ['made', 'cost', 'completed'];

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
});
afterEach(() => small.close());

function asked(over: Partial<ClaimsAsked> = {}): ClaimsAsked {
  return { filters: {}, asOf: '2026-01-31', sort: 'made', money: 'seen', ...over };
}
const reader = () => small.store.scoped(small.scope('AAA', 'BBB'));
const page = (over: Partial<ClaimsAsked> = {}, limit = 200, after: ClaimPage['next'] = null) =>
  listClaims(reader(), { ...asked(over), after, limit });

/** A claim drawn about the days at which its standing turns: month ends, the end of the warranty, the day of the list. */
const drawn = fc.record({
  branch: fc.constantFrom('AAA', 'BBB'),
  completedOn: fc
    .tuple(fc.constantFrom('2024-01-31', '2024-02-29', '2023-08-31', '2023-02-28'), fc.nat(2))
    .map(([day, later]) => addDays(day, later)),
  package: fc.constantFrom('full' as const, 'cavity' as const, 'bare' as const),
  months: fc.nat(38),
  days: fc.integer({ min: -1, max: 1 }),
  decision: fc.constantFrom(...CLAIM_DECISIONS),
  decidedAfter: fc.option(fc.nat(400)),
  costCents: fc.nat(3),
});
type Drawn = typeof drawn extends fc.Arbitrary<infer Value> ? Value : never;

/** Keeps each on a job of its own; the package without a warranty is one whose months were taken to 0. */
function keep(run: number, claims: readonly Drawn[]): void {
  claims.forEach((one, index) => {
    const ref = `${run}-${index}`;
    const bare = one.package === 'bare';
    small.write(one.branch, ref, {
      ...unbilledJob(one.completedOn),
      package: bare ? 'cavity' : one.package,
    });
    if (bare) {
      const driver = small.store.writing.driver;
      driver.prepare('update job_facts set warranty_months = 0 where job_ref = ?').run(ref);
    }
    const day = addDays(addMonths(one.completedOn, one.months), one.days);
    const madeOn = day < one.completedOn ? one.completedOn : day;
    const decidedOn = one.decidedAfter === null ? undefined : addDays(madeOn, one.decidedAfter);
    const { decision, costCents } = one;
    const sent = claimContent.parse({
      ...{ jobRef: ref, madeOn, zone: 'floor', cause: 'damage' },
      ...{ decision, decidedOn, costCents },
    });
    const writer = new ClaimWriter(small.store, small.branch(one.branch));
    acceptClaim(writer, ref, sent, { ...RECEIPT, role: 'head_office', limitCents: null });
  });
}

describe('listClaims', () => {
  const MONTHS = { full: 36, cavity: 24, bare: 0 };

  it('given any claims and day, counts those that claimStanding counts, in rows, filter and totals (rule 14)', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(
        fc.array(drawn, { minLength: 1, maxLength: 20 }),
        fc.integer({ min: -30, max: 1200 }).map((days) => addDays('2024-01-31', days)),
        async (claims, asOf) => {
          run += 1;
          await small.store.queue.write(() => {
            small.store.writing.prepare('delete from job_facts').run();
            keep(run, claims);
          });
          const { items } = page({ asOf });
          expect(items).toHaveLength(claims.length);
          for (const row of items) {
            const months = MONTHS[claims[Number(row.claimRef.split('-')[1])]!.package];
            const end = months === 0 ? undefined : warrantyEnd(row.completedOn, months);
            expect(row.counted).toBe(claimStanding(row, end, asOf) === 'counted');
            expect(row.inWarranty).toBe(end !== undefined && row.madeOn <= end);
            expect(row.month).toBe(monthInService(row.completedOn, row.madeOn));
          }
          for (const counted of [true, false]) {
            const some = page({ asOf, filters: { counted } });
            const same = items.filter((row) => row.counted === counted);
            expect(some.items).toEqual(same);
            const cost = same.reduce((sum, row) => sum + row.costCents!, 0);
            expect([some.claims, some.costCents]).toEqual([same.length, cost]);
          }
        },
      ),
      { numRuns: 40 },
    );
  });

  it('given any claims and page size, gives each once in one order whatever the sort, as an export does', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(
        fc.array(drawn, { maxLength: 20 }),
        fc.integer({ min: 1, max: 7 }),
        async (claims, limit) => {
          run += 1;
          await small.store.queue.write(() => {
            small.store.writing.prepare('delete from job_facts').run();
            keep(run, claims);
          });
          for (const sort of SORTS) {
            const whole = page({ sort });
            const walked: ClaimPage['items'] = [];
            let after: ClaimPage['next'] = null;
            do {
              const part: ClaimPage = page({ sort }, limit, after);
              walked.push(...part.items);
              after = part.next;
            } while (after !== null);
            expect(walked).toEqual(whole.items);
            expect([...everyClaim(reader(), asked({ sort }))].flat()).toEqual(whole.items);
            expect(whole.items).toHaveLength(claims.length);
          }
        },
      ),
      { numRuns: 15 },
    );
  });
});
