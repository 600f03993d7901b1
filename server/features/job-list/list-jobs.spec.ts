import fc from 'fast-check';
import type { JobSort, ListFilters } from '#db/queries/job-list';
import type { JobRow } from '#shared/contracts/job-list';
import { addDays } from '#shared/domain/calendar';
import { keptJob, unbilledJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { everyJob, listJobs, type JobPage, type JobsAsked } from './list-jobs';

const TODAY = '2026-02-02';
const SORTS: readonly JobSort[] = ['completed', 'margin', 'difference', 'overrun', 'waiting'];

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
});
afterEach(() => small.close());

function asked(filters: ListFilters, sort: JobSort = 'completed'): JobsAsked {
  const todayByBranch = { AAA: TODAY, BBB: TODAY, CCC: TODAY };
  return { filters, sort, todayByBranch, money: 'seen' };
}
const reader = (branches = ['AAA', 'BBB', 'CCC']) => small.store.scoped(small.scope(...branches));
function list(
  filters: ListFilters = {},
  sort: JobSort = 'completed',
  page: { after?: JobPage['next']; limit?: number } = {},
): JobPage {
  const { after = null, limit = 200 } = page;
  return listJobs(reader(), { ...asked(filters, sort), after, limit });
}
const refs = (page: JobPage) => page.items.map((item) => item.jobRef);

/** Every page of a list, one after another. */
function walk(sort: JobSort, limit: number, between: () => void = () => undefined): JobRow[] {
  const items: JobRow[] = [];
  let after: JobPage['next'] = null;
  do {
    const page = list({}, sort, { after, limit });
    items.push(...page.items);
    after = page.next;
    between();
  } while (after !== null);
  return items;
}

describe('listJobs', () => {
  it('given no sort, lists the newest completion first, then by branch and reference (rule 67)', async () => {
    await small.putJob('BBB', 'b', keptJob('2026-01-28', 0.4));
    await small.putJob('AAA', 'z', keptJob('2026-01-28', 0.4));
    await small.putJob('AAA', 'B', keptJob('2026-01-28', 0.4));
    await small.putJob('AAA', 'old', keptJob('2021-01-28', 0.4));
    await small.putJob('AAA', 'new', keptJob('2026-01-29', 0.4));
    expect(refs(list())).toEqual(['new', 'B', 'z', 'b', 'old']);
  });

  it('given the sorts of a screen, puts the worst, largest or longest first and rows without it last', async () => {
    const estimate = (price: number, minutes: number) => ({
      estimate: { priceCents: price, stages: { strip: minutes } },
    });
    await small.putJob('AAA', 'poor', { ...keptJob('2026-01-05', 0.1), ...estimate(20_000, 0) });
    await small.putJob('AAA', 'rich', { ...keptJob('2026-01-06', 0.6), ...estimate(90_000, 10) });
    await small.putJob('AAA', 'long', {
      ...keptJob('2026-01-07', 0.5),
      actual: { stages: { strip: 90 } },
      ...estimate(60_000, 30),
    });
    await small.putJob('AAA', 'open', unbilledJob('2026-01-09'));
    await small.putJob('AAA', 'waits', unbilledJob('2026-01-08'));
    expect(refs(list({}, 'margin')).slice(0, 3)).toEqual(['poor', 'long', 'rich']);
    expect(refs(list({}, 'margin')).slice(3)).toEqual(['open', 'waits']);
    // Kept less expected: rich 600.00 − 801.00, long 446.00 − 504.00, poor 100.00 − 142.00.
    expect(refs(list({}, 'difference')).slice(0, 3)).toEqual(['rich', 'long', 'poor']);
    expect(refs(list({}, 'overrun')).slice(0, 2)).toEqual(['long', 'rich']);
    expect(refs(list({}, 'waiting')).slice(0, 2)).toEqual(['waits', 'open']);
    for (const sort of SORTS) expect(list({}, sort).jobs).toBe(5);
  });

  it('given a job, tells its row (rules 50 and 84)', async () => {
    await small.putJob('AAA', 'one', {
      ...unbilledJob('2026-01-28'),
      vehicle: {
        key: 'K-1',
        make: 'Vela',
        model: 'Ono',
        bodyType: 'van',
        firstRegistered: '2010-01',
      },
      estimate: { priceCents: 50_000, stages: { strip: 60, apply: 120 } },
      actual: { stages: { strip: 100, apply: 200, repair: 45 } },
      boughtInCents: 300,
      agreedExtras: [{ on: '2026-01-27', minutes: 20, priceCents: 1500 }],
      findings: [
        {
          zone: 'sill_outer',
          side: 'left',
          seenAs: 'holed',
          workedAs: 'holed',
          structural: true,
          action: 'patched',
          repairMinutes: 30,
          chargedCents: 4000,
        },
      ],
    });
    expect(list().items).toEqual([
      {
        branch: 'AAA',
        jobRef: 'one',
        revision: 1,
        vehicle: {
          key: 'K-1',
          make: 'Vela',
          model: 'Ono',
          bodyType: 'van',
          firstRegistered: '2010-01',
        },
        package: 'full',
        completedOn: '2026-01-28',
        hasRot: true,
        unbilled: true,
        daysWaiting: 5,
        estimatedMinutes: 180,
        actualMinutes: 345,
        overrunMinutes: 165,
        beyondChargedMinutes: 135,
        agreedExtraMinutes: 20,
        agreedExtraCents: 1500,
        revenueCents: null,
        costCents: 21_000,
        marginCents: null,
        marginShare: null,
        expectedMarginCents: null,
        largestStep: null,
      },
    ]);
    const { items } = listJobs(reader(), { ...asked({}), money: 'unseen', after: null, limit: 9 });
    expect(Object.keys(items[0] ?? {}).filter((key) => /cents|margin|step/i.test(key))).toEqual([]);
  });

  it('given a job whose cost is not known, has no money for it', async () => {
    await small.putJob('AAA', 'one', {
      ...keptJob('2026-01-28', 0.4),
      products: [{ product: 'UW1', ml: 10 }],
    });
    const money = { revenueCents: null, costCents: null, marginCents: null, marginShare: null };
    expect(list().items[0]).toMatchObject({ ...money, expectedMarginCents: null });
  });

  it('given filters, lists what fits them all', async () => {
    const vehicle = keptJob('2026-01-05', 0).vehicle;
    const put = (ref: string, over: object, on = '2026-01-05') =>
      small.putJob('AAA', ref, { ...keptJob(on, 0.4), ...over });
    await put('plain', {});
    await put('Größe 50%_7', { vehicle: { ...vehicle, make: 'ÅÄÖ  Works', model: 'Éclair' } });
    await put('suv', { vehicle: { ...vehicle, bodyType: 'suv', firstRegistered: '2024-02' } });
    await put('cavity', { package: 'cavity' }, '2026-01-07');
    await put('open', { invoice: undefined });
    await put('est', { estimate: { priceCents: 1, stages: { strip: 1 } } });
    await put('rot', {
      findings: [
        { zone: 'floor', side: 'left', seenAs: 'bubbling', structural: false, action: 'declined' },
      ],
    });
    const found = (filters: ListFilters) => refs(list(filters)).sort();
    expect(found({ text: 'GRÖSSE' })).toEqual([]);
    expect(found({ text: 'gRÖße' })).toEqual(['Größe 50%_7']);
    expect(found({ text: 'åäö works É' })).toEqual(['Größe 50%_7']);
    expect(found({ text: 'e\u0301clair' })).toEqual(['Größe 50%_7']);
    expect(found({ text: '%' })).toEqual(['Größe 50%_7']);
    expect(found({ text: '_' })).toEqual(['Größe 50%_7']);
    expect(found({ text: '  ' })).toHaveLength(7);
    expect(found({ make: ' åäö works ' })).toEqual(['Größe 50%_7']);
    expect(found({ make: 'åäö' })).toEqual([]);
    expect(found({ model: 'ÉCLAIR' })).toEqual(['Größe 50%_7']);
    expect(found({ model: 'clair' })).toEqual([]);
    expect(found({ make: 'vela', model: 'ONO' })).toHaveLength(6);
    expect(found({ bodyTypes: ['suv'] })).toEqual(['suv']);
    expect(found({ ageBandIndex: 0 })).toEqual(['suv']);
    expect(found({ packageIds: [small.store.state.package('cavity')?.id ?? 0] })).toEqual([
      'cavity',
    ]);
    expect(found({ from: '2026-01-06' })).toEqual(['cavity']);
    expect(found({ to: '2026-01-06' })).toHaveLength(6);
    expect(found({ unbilled: true })).toEqual(['open']);
    expect(found({ unbilled: false })).toHaveLength(6);
    expect(found({ hasEstimate: true })).toEqual(['est']);
    expect(found({ hasRot: true })).toEqual(['rot']);
    expect(found({ hasRot: true, unbilled: true })).toEqual([]);
  });
});

describe('listJobs, by page', () => {
  const drawn = fc.record({
    branch: fc.constantFrom('AAA', 'BBB'),
    day: fc.nat(900),
    share: fc.integer({ min: -3, max: 3 }),
    billed: fc.boolean(),
    minutes: fc.option(fc.nat(3), { nil: undefined }),
  });

  it('given any jobs and page size, gives each job once in one order whatever the sort, as an export does', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(
        fc.array(drawn, { maxLength: 25 }),
        fc.integer({ min: 1, max: 9 }),
        async (jobs, limit) => {
          run += 1;
          await small.store.queue.write(() => {
            for (const table of ['job_facts', 'job_products']) {
              small.store.writing.prepare(`delete from ${table}`).run();
            }
            jobs.forEach(({ branch, day, share, billed, minutes }, index) => {
              const on = addDays('2023-08-01', day);
              small.write(branch, `${run}-${index}`, {
                ...(billed ? keptJob(on, share / 10) : unbilledJob(on)),
                estimate:
                  minutes === undefined ? undefined : { priceCents: 1, stages: { strip: minutes } },
              });
            });
          });
          for (const sort of SORTS) {
            const whole = list({}, sort);
            expect(whole.next).toBeNull();
            expect(walk(sort, limit)).toEqual(whole.items);
            expect([...everyJob(reader(), asked({}, sort))].flat()).toEqual(whole.items);
            expect(whole.items).toHaveLength(jobs.length);
          }
        },
      ),
      { numRuns: 15 },
    );
  });

  it('given jobs that arrive between two pages, still gives every job that was there once', async () => {
    for (let day = 1; day <= 9; day += 1) {
      await small.putJob('AAA', `day-${day}`, keptJob(`2026-01-0${day}`, day / 20));
    }
    for (const sort of SORTS) {
      const before = refs(list({}, sort));
      let arrived = 0;
      const seen = walk(sort, 2, () => {
        arrived += 1;
        if (arrived > 3) return;
        small.store.writing.driver.transaction(() => {
          small.write('BBB', `${sort}-new-${arrived}`, keptJob('2026-01-09', 0.01));
          small.write('BBB', `${sort}-old-${arrived}`, keptJob('2020-01-09', 0.9));
        })();
      }).map((item) => item.jobRef);
      expect(seen.filter((ref) => before.includes(ref))).toEqual(before);
      expect(new Set(seen).size).toBe(seen.length);
    }
  });
});
