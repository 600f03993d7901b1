import { sql } from '#db/database';
import { recordAudit, verifyAudit } from '#db/queries/audit';
import { RECEIPT, SmallStore } from '../support/small-store';

let small: SmallStore;
beforeEach(async () => {
  small = await SmallStore.make();
  await small.putJob('AAA', 'a');
  await small.putJob('AAA', 'a', { notes: 'corrected' } as never);
  await small.voidJob('AAA', 'a');
});
afterEach(() => small.close());

const audit = (detail: Record<string, unknown>): Promise<void> =>
  small.store.queue.write(() =>
    recordAudit(small.store.unscoped, {
      at: RECEIPT.receivedAt,
      actor: RECEIPT.actor,
      action: 'test.do',
      subject: '/',
      branchId: null,
      detail,
    }),
  );
const verify = () => verifyAudit(small.store.unscoped);
const execute = (text: string) => () => small.store.writing.driver.exec(text);

describe('The append-only tables', () => {
  it.each([
    'job_revisions',
    'claim_revisions',
    'come_back_marks',
    'audit_events',
    'warranty_reports',
  ])('given a change or removal in %s, refuse it', async (table) => {
    if (table === 'claim_revisions') {
      small.store.writing.driver.exec(
        `insert into claims (id, branch_id, job_id, claim_ref, revision, made_on, zone, cause, decision,
            labour_minutes, product_ml, cost_cents)
            values (1, 1, 1, 'c', 1, '2026-01-30', 'floor', 'damage', 'open', 0, 0, 0);
           insert into claim_revisions (claim_id, revision, content, received_at, source)
            values (1, 1, '{}', '2026-01-30', 'person')`,
      );
    }
    if (table === 'come_back_marks') small.store.writing.driver.exec(ONE_MARK);
    if (table === 'warranty_reports') small.store.writing.driver.exec(ONE_REPORT);
    const column = COLUMNS[table] ?? 'content';
    const before = small.store.unscoped.all(sql(table));
    expect(before.length).toBeGreaterThan(0);
    expect(execute(`update ${table} set ${column} = '{}'`)).toThrow('append-only');
    expect(execute(`delete from ${table}`)).toThrow('append-only');
    expect(small.store.unscoped.all(sql(table))).toEqual(before);
  });

  it('given a row written over by its key, refuse that too', () => {
    small.store.writing.driver.exec(ONE_MARK);
    small.store.writing.driver.exec(ONE_REPORT);
    for (const [table, text] of Object.entries(REPLACED)) {
      const before = small.store.unscoped.all(sql(table));
      expect(before.length).toBeGreaterThan(0);
      expect(execute(text)).toThrow('append-only');
      expect(small.store.unscoped.all(sql(table))).toEqual(before);
    }
  });
});

/** The column that a test tries to change, where it is not the content. */
const COLUMNS: Record<string, string> = {
  audit_events: 'detail',
  come_back_marks: 'note',
  warranty_reports: 'report',
};

const ONE_REPORT = `insert into warranty_reports
    (id, as_of, issued_at, summary, report, csv, csv_sha256, pdf, pdf_sha256)
    values (1, '2026-01-31', '2026-02-02', '{}', '{}', '', '', x'25', '')`;

const ONE_MARK = `insert into people (id, email, email_key, name, role, created_at)
    values (7, 'a@b.example', 'a@b.example', 'A', 'site_manager', '2026-01-01');
  insert into come_back_marks (branch_id, job_id, ref, revision, status, note, person_id, changed_at)
    values (1, 1, 'floor/left/1', 1, 'contacted', '', 7, '2026-01-30')`;

const REPLACED: Record<string, string> = {
  warranty_reports: `replace into warranty_reports
    (id, as_of, issued_at, summary, report, csv, csv_sha256, pdf, pdf_sha256)
    values (1, '2026-01-30', '2026-02-02', '{}', '{}', '', '', x'26', '')`,
  come_back_marks: `replace into come_back_marks
    (branch_id, job_id, ref, revision, status, note, person_id, changed_at)
    values (1, 1, 'floor/left/1', 1, 'gone', '', 7, '2026-01-31')`,
  job_revisions: `replace into job_revisions (job_id, revision, change, content, received_at, source)
    values (1, 1, 'created', '{}', '2026-01-01', 'person')`,
  audit_events: `replace into audit_events
    (id, at, actor, address, action, subject, detail, previous_hash, hash)
    values (1, '2026-01-01', 'x', 'x', 'x', 'x', '{}', 'x', 'x')`,
};

describe('verifyAudit', () => {
  it('given a trail as it was written, holds to its last event', async () => {
    for (let n = 0; n < 1200; n += 1) void audit({ n });
    await audit({ last: true });
    const last = small.store.writing.driver
      .prepare('select hash from audit_events order by id desc limit 1')
      .pluck()
      .get();
    expect(verify()).toMatchObject({ events: 1203, brokenAt: null, lastHash: last });
  });

  it.each([
    ['a changed detail', "update audit_events set detail = '{}' where id = 2", 2],
    ['a changed actor', "update audit_events set actor = 'somebody else' where id = 1", 1],
    ['a changed time', "update audit_events set at = '2020-01-01T00:00:00.000Z' where id = 3", 3],
    ['another address', "update audit_events set address = 'elsewhere' where id = 1", 1],
    ['another branch', 'update audit_events set branch_id = 2 where id = 1', 1],
    ['a removed event', 'delete from audit_events where id = 2', 3],
    ['a removed first event', 'delete from audit_events where id = 1', 2],
    ['a new hash put on', "update audit_events set hash = 'x' where id = 2", 2],
    [
      'two events that changed places',
      `update audit_events set id = 9 where id = 1; update audit_events set id = 1 where id = 2;
       update audit_events set id = 2 where id = 9`,
      1,
    ],
  ])('given %s behind the triggers’ back, names the event', async (_, text, brokenAt) => {
    await audit({ third: true });
    small.store.writing.driver.exec(
      `drop trigger audit_events_no_update; drop trigger audit_events_no_delete; ${text}`,
    );
    expect(verify().brokenAt).toBe(brokenAt);
  });

  it('given an event without the hash before it, names it', async () => {
    small.store.writing.driver.exec(
      `insert into audit_events (at, actor, address, action, subject, detail, previous_hash, hash)
        values ('2026-01-01', 'x', 'x', 'x', 'x', '{}', 'made up', 'made up')`,
    );
    expect(verify()).toMatchObject({ events: 2, brokenAt: 3 });
  });
});
