import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { sql } from '#db/database';
import { verifyAudit } from '#db/queries/audit';
import { isEmptyNetwork } from '#db/queries/empty-network';
import { listPeople } from '#db/queries/people';
import { matchPushKey } from '#db/queries/push-keys';
import { Scope } from '#db/scope';
import { Store } from '#db/store';
import { listComeBacks } from '#server/features/come-back/list-come-backs';
import { deriveFigures } from '#shared/domain/job-figures';
import { OPEN_COME_BACKS, type ComeBackStatus } from '#shared/domain/vocabulary';
import { historyOf } from './branch-history';
import { BRANCHES } from './branches';
import { costBookOf } from './demo-costs';
import { newestContent, type BranchHistory, type DemoNetwork } from './demo-network';
import { DEMO_PEOPLE, DEMO_PUSH_KEY } from './demo-people';
import { DEMO_SEED, generateNetwork } from './generate-network';
import { loadNetwork } from './load-network';
import { recordedFrom } from './measured-cars';

const TODAY = '2026-02-02';
const PLAIN = { hash: async (password: string) => `hash of ${password}` };

/** The demo network with the histories of two branches only: the same path in a tenth of the time. */
function smallDemo(): DemoNetwork & { branches: BranchHistory[] } {
  const network = generateNetwork({ seed: DEMO_SEED, today: TODAY });
  const branches = BRANCHES.filter(({ code }) => code === 'HAV' || code === 'HEI').map((branch) =>
    historyOf(branch, DEMO_SEED, TODAY),
  );
  return { ...network, histories: () => branches, branches };
}

describe('loadNetwork', () => {
  let folder: string;
  let store: Store;
  const demo = smallDemo();

  beforeAll(async () => {
    folder = mkdtempSync(join(tmpdir(), 'underseam-demo-'));
    store = await Store.open(folder);
    await loadNetwork(store, PLAIN, TODAY, demo);
  });

  afterAll(() => {
    store.close();
    rmSync(folder, { recursive: true, force: true });
  });

  test('into an empty folder, writes the whole set-up', () => {
    expect(store.state.branches.map((branch) => branch.code)).toEqual(
      demo.setUp.branches.map((branch) => branch.code).sort(),
    );
    expect(rows('regions')).toBe(4);
    expect(rows('branch_rates')).toBe(demo.setUp.rates.length);
    expect(rows('product_costs')).toBe(demo.setUp.productCosts.length);
    expect(rows('consumable_costs')).toBe(demo.setUp.consumableCosts.length);
    expect(rows('network_fees')).toBe(demo.setUp.fees.length + 1);
  });

  test('for every job, keeps each version, and figures of the newest unless it is voided', () => {
    const jobs = demo.branches.flatMap((history) => history.jobs);
    const versions = jobs.reduce((all, job) => all + 1 + (job.corrections?.length ?? 0), 0);
    expect(rows('jobs')).toBe(jobs.length);
    expect(rows('job_revisions')).toBe(versions);
    expect(rows('job_facts')).toBe(jobs.filter((job) => !job.voided).length);
    expect(jobs.filter((job) => job.voided).length).toBeGreaterThan(0);
  });

  test('for each branch, has the cents that a recount of the raw jobs gives', () => {
    const costs = costBookOf(demo.setUp);
    for (const { branchCode, jobs } of demo.branches) {
      const recount = { revenue: 0, labour: 0, product: 0, consumables: 0, fee: 0 };
      for (const job of jobs.filter((one) => !one.voided)) {
        const figures = deriveFigures(recordedFrom(newestContent(job)), branchCode, costs);
        if (!figures.billed || !figures.money) continue;
        recount.revenue += figures.money.revenueCents;
        recount.labour += figures.money.labourCents + figures.money.repairLabourCents;
        recount.product += figures.money.productCents;
        recount.consumables += figures.money.consumablesCents;
        recount.fee += figures.money.feeCents;
      }
      expect(recount.revenue).toBeGreaterThan(0);
      expect(moneyOf(branchCode)).toEqual(recount);
    }
  });

  test('for claims, bookings and notes, keeps every one', () => {
    const count = (list: (history: BranchHistory) => unknown[]) =>
      demo.branches.reduce((all, history) => all + list(history).length, 0);
    expect(rows('claims')).toBe(count((history) => history.claims));
    expect(rows('bookings')).toBe(count((history) => history.bookings));
    expect(rows('week_notes')).toBe(count((history) => history.weekNotes));
    expect(rows('week_notes')).toBeGreaterThan(0);
    expect(store.unscoped.all(sql('claims').whereNotNull('proposed_decision'))).toEqual([]);
  });

  test('for what was left on cars, has a list that a manager can work through', () => {
    const manager = Scope.ofGrant(store.state.branches, {
      role: 'site_manager',
      branchIds: store.state.branches.filter(({ code }) => code === 'HAV').map(({ id }) => id),
      regionCodes: [],
    });
    const asked = { filters: {}, limit: 200, after: null };
    const list = (...statuses: ComeBackStatus[]) =>
      listComeBacks(store.scoped(manager), { ...asked, statuses });
    const marks = demo.branches.reduce((all, { comeBackMarks }) => all + comeBackMarks.length, 0);
    expect(rows('come_back_marks')).toBe(marks);
    const open = list(...OPEN_COME_BACKS);
    expect(open.findings).toBeGreaterThan(20);
    expect(open.findings).toBeLessThan(80);
    expect(open.dangerousNotTold).toBeGreaterThan(0);
    expect(open.dangerousNotTold).toBeLessThan(10);
    expect(new Set(open.items.map(({ status }) => status))).toEqual(new Set(OPEN_COME_BACKS));
    const { items } = list('done');
    expect(items.filter(({ closedByJobRef }) => closedByJobRef !== null).length).toBeGreaterThan(
      20,
    );
    expect(items.some(({ closedByJobRef }) => closedByJobRef === null)).toBe(true);
  });

  test('in the audit trail, tells later events in time order on an unbroken chain', () => {
    const trail = verifyAudit(store.unscoped);
    expect(trail.brokenAt).toBeNull();
    expect(trail.events).toBeGreaterThan(100);
    const times = store.unscoped
      .all<{ at: string }>(sql('audit_events').orderBy('id').select('at'))
      .map((event) => event.at);
    expect(times).toEqual([...times].sort());
  });

  test('for the demo people and key, lets them in as printed', () => {
    const people = listPeople(store.unscoped);
    expect(
      people.map(({ email, role, branches, regions }) => ({ email, role, branches, regions })),
    ).toEqual(
      [...DEMO_PEOPLE]
        .sort((a, b) => (a.email < b.email ? -1 : 1))
        .map(({ email, role, branches, regions }) => ({ email, role, branches, regions })),
    );
    const [, id, secret] = /^usk_([0-9a-f]{12})_([0-9a-f]{64})$/.exec(DEMO_PUSH_KEY.key) ?? [];
    const key = matchPushKey(store.unscoped, { id: id!, secret: secret! });
    const havnsund = store.state.branches.find((branch) => branch.code === DEMO_PUSH_KEY.branch);
    expect(key?.branchId).toBe(havnsund?.id);
  });

  test('broken off half-way, leaves the folder as empty as it was', async () => {
    const other = mkdtempSync(join(tmpdir(), 'underseam-demo-'));
    const broken = await Store.open(other);
    const half: DemoNetwork = {
      ...demo,
      histories: function* () {
        yield demo.branches[1]!;
        throw new Error('the power went');
      },
    };
    await expect(loadNetwork(broken, PLAIN, TODAY, half)).rejects.toThrow('the power went');
    expect(isEmptyNetwork(broken.unscoped)).toBe(true);
    expect(broken.state.branches).toEqual([]);
    broken.close();
    rmSync(other, { recursive: true, force: true });
  });

  function rows(table: string): number {
    return store.unscoped.first<{ n: number }>(sql(table).count({ n: '*' }))!.n;
  }

  function moneyOf(branch: string): Record<string, number> {
    return store.unscoped.first<Record<string, number>>(
      sql('job_facts')
        .join('branches', 'branches.id', 'job_facts.branch_id')
        .where({ 'branches.code': branch, billed: 1, costed: 1 })
        .sum({
          revenue: 'revenue_cents',
          labour: sql.raw('labour_cents + repair_labour_cents'),
          product: 'product_cents',
          consumables: 'consumables_cents',
          fee: 'fee_cents',
        }),
    )!;
  }
});
