import fc from 'fast-check';
import { ComeBackWriter } from '#db/come-back-writer';
import { sql } from '#db/database';
import type { ComeBack } from '#shared/contracts/come-back';
import { addDays } from '#shared/domain/calendar';
import {
  ACTIONS,
  COME_BACK_STATUSES,
  CONDITIONS,
  OPEN_COME_BACKS,
  SIDES,
  ZONES,
} from '#shared/domain/vocabulary';
import { keptJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { everyComeBack, listComeBacks, type ComeBackPage } from './list-come-backs';

const BRANCHES = ['AAA', 'BBB'];
let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
  await small.store.queue.write(() =>
    small.store.unscoped.run(
      sql('people').insert({ email: 'a', email_key: 'a', name: 'A', role: 'x', created_at: '' }),
    ),
  );
});
afterEach(() => small.close());

const reader = () => small.store.scoped(small.scope(...BRANCHES));
function page(
  statuses: ComeBackPage['items'][number]['status'][],
  limit = 200,
  after: ComeBackPage['next'] = null,
): ComeBackPage {
  return listComeBacks(reader(), { filters: {}, statuses, limit, after });
}

const finding = fc.record({
  zone: fc.constantFrom(...ZONES.slice(0, 3)),
  side: fc.constantFrom(...SIDES),
  seenAs: fc.constantFrom(...CONDITIONS),
  workedAs: fc.option(fc.constantFrom(...CONDITIONS), { nil: undefined }),
  structural: fc.boolean(),
  action: fc.constantFrom(...ACTIONS),
  mark: fc.option(fc.constantFrom(...COME_BACK_STATUSES), { nil: undefined }),
  told: fc.boolean(),
});
const job = fc.record({
  branch: fc.constantFrom(...BRANCHES),
  ref: fc.constantFrom('é', 'Z', '10', '9', 'a/b', '%2F', '車'),
  day: fc.nat(3),
  key: fc.option(fc.constantFrom('K-1', 'K-2'), { nil: undefined }),
  findings: fc.array(finding, { maxLength: 3 }),
  voided: fc.boolean(),
});
type DrawnJob = typeof job extends fc.Arbitrary<infer T> ? T : never;
type Drawn = DrawnJob & { jobRef: string; on: string };

/** Puts drawn jobs, marks and voids where they belong, in the order drawn. */
function fill(jobs: readonly Drawn[]): void {
  for (const { branch, jobRef, on, key, findings } of jobs) {
    const plain = keptJob(on, 0.4);
    small.write(branch, jobRef, {
      ...plain,
      vehicle: { ...plain.vehicle, key },
      findings: findings.map(({ mark: _mark, told: _told, ...sent }, n) => ({
        ...sent,
        ref: `f/${n}`,
      })),
    });
    const writer = new ComeBackWriter(small.store, small.branch(branch));
    findings.forEach(({ mark, told }, n) => {
      const found = writer.find(jobRef, `f/${n}`);
      if (!found || mark === undefined) return;
      const actor = { label: 'a', personId: 1, pushKeyId: null, address: 'local' };
      const ownerToldOn = told ? on : null;
      const set = { status: mark, dueOn: null, note: '', ownerToldOn };
      writer.mark(found, set, null, { actor, at: '2026-02-02T00:00:00.000Z' });
    });
  }
}

const isHoled = (item: Pick<ComeBack, 'seenAs' | 'workedAs'>): boolean =>
  item.seenAs === 'holed' || item.workedAs === 'holed';
const dangerOf = (item: ComeBack): number =>
  item.structural ? (isHoled(item) ? 0 : 1) : isHoled(item) ? 2 : 3;
/** Text by its bytes, as SQLite compares it. */
const bytes = (text: string): string => Buffer.from(text).toString('hex');
const keyOf = (item: ComeBack): string =>
  [
    ...[dangerOf(item), item.completedOn, item.branch, bytes(item.jobRef)],
    ...[10 + ZONES.indexOf(item.zone), SIDES.indexOf(item.side), bytes(item.ref)],
  ].join(' ');

/** What must be listed, worked out the long way: each as `branch jobRef ref status closedBy`. */
function expected(jobs: readonly Drawn[]): string[] {
  const counted = jobs.map((one, id) => ({ ...one, id })).filter(({ voided }) => !voided);
  return counted.flatMap((one) =>
    one.findings.flatMap((left, n) => {
      if (left.action !== 'deferred' && left.action !== 'declined') return [];
      const later = counted
        .filter(
          (other) =>
            one.key !== undefined &&
            other.key === one.key &&
            other.branch === one.branch &&
            (other.on > one.on || (other.on === one.on && other.id > one.id)) &&
            other.findings.some(
              ({ zone, side, action }) =>
                zone === left.zone &&
                side === left.side &&
                (action === 'treated' || action === 'patched'),
            ),
        )
        .sort((a, b) => (a.on === b.on ? a.id - b.id : a.on < b.on ? -1 : 1))[0];
      const closing = left.mark === 'gone' ? undefined : later;
      const status = closing ? 'done' : (left.mark ?? 'open');
      return [`${one.branch} ${one.jobRef} f/${n} ${status} ${closing?.jobRef ?? null}`];
    }),
  );
}

describe('listComeBacks', () => {
  it('given any jobs, marks and voids, lists what a count by hand lists, in its order, by any pages', async () => {
    let run = 0;
    await fc.assert(
      fc.asyncProperty(
        fc.array(job, { maxLength: 12 }),
        fc.integer({ min: 1, max: 5 }),
        async (drawn, limit) => {
          run += 1;
          const jobs = drawn.map((one, n) => ({
            ...one,
            jobRef: `${one.ref} ${n} ${run}`,
            on: addDays('2026-01-05', one.day),
          }));
          await small.store.queue.write(() => {
            for (const table of ['job_facts', 'job_products', 'job_findings']) {
              small.store.writing.prepare(`delete from ${table}`).run();
            }
            fill(jobs);
          });
          for (const { branch, jobRef } of jobs.filter(({ voided }) => voided)) {
            await small.voidJob(branch, jobRef);
          }
          const whole = page([...COME_BACK_STATUSES]);
          const { items } = whole;
          expect(
            items
              .map(
                (one) =>
                  `${one.branch} ${one.jobRef} ${one.ref} ${one.status} ${one.closedByJobRef}`,
              )
              .sort(),
          ).toEqual(expected(jobs).sort());
          const keys = items.map(keyOf);
          expect(keys).toEqual([...keys].sort());
          const open = items.filter(({ status }) => OPEN_COME_BACKS.some((one) => one === status));
          const dangerous = open.filter(
            (one) =>
              one.structural &&
              (one.seenAs !== 'surface' || (one.workedAs ?? 'surface') !== 'surface'),
          );
          const cars = open.map((one) => `${one.branch} ${one.vehicle.key ?? one.jobRef}`);
          const totals = {
            findings: open.length,
            dangerous: dangerous.length,
            dangerousNotTold: dangerous.filter(({ ownerToldOn }) => ownerToldOn === null).length,
            cars: new Set(cars).size,
          };
          expect(page([...OPEN_COME_BACKS], 1)).toMatchObject(totals);
          const walked: ComeBack[] = [];
          let next: ComeBackPage['next'] = null;
          do {
            const part: ComeBackPage = page([...OPEN_COME_BACKS], limit, next);
            expect(part.items.length).toBeLessThanOrEqual(limit);
            walked.push(...part.items);
            next = part.next;
          } while (next !== null);
          expect(walked).toEqual(open);
          const asked = { filters: {}, statuses: OPEN_COME_BACKS };
          expect([...everyComeBack(reader(), asked)].flat()).toEqual(open);
        },
      ),
      { numRuns: 40 },
    );
  });

  it('given findings that arrive between two pages, still gives those that were there once each', async () => {
    const left = (zone: string, structural: boolean) =>
      [{ ref: 'x', zone, side: 'left', seenAs: 'holed', structural, action: 'deferred' }] as never;
    for (let n = 0; n < 7; n += 1) {
      await small.putJob('AAA', `old-${n}`, {
        ...keptJob('2026-01-10', 0.4),
        findings: left('floor', n % 2 === 0),
      });
    }
    const seen: string[] = [];
    let next: ComeBackPage['next'] = null;
    do {
      const part: ComeBackPage = page(['open'], 2, next);
      seen.push(...part.items.map(({ jobRef }) => jobRef));
      next = part.next;
      if (seen.length > 4) continue;
      await small.putJob('BBB', `first-${seen.length}`, {
        ...keptJob('2020-01-10', 0.4),
        findings: left('floor', true),
      });
    } while (next !== null);
    expect(seen).toEqual(['old-0', 'old-2', 'old-4', 'old-6', 'old-1', 'old-3', 'old-5']);
  });
});
