import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** When the warranty report is issued by itself, and who is told. */
export interface ScheduleRow {
  active: boolean;
  dayOfMonth: number;
  people: number[];
  changedAt: string;
  changedBy: string;
}

/** A month's run: it is there or not, and there is one at most. */
export interface RunRow {
  /** `2026-02` */
  month: string;
  at: string;
  report: number;
}

/** A mail of a run. */
export interface RunMail {
  to: string;
  attempts: number;
  sentAt: string | null;
  nextAttemptAt: string | null;
  lastError: string | null;
  /** Gone once it was sent or given up. */
  hasText: boolean;
}

/** What was set, or `undefined` while nothing was. */
export function readSchedule(db: UnscopedDb): ScheduleRow | undefined {
  const row = db.first<Omit<ScheduleRow, 'active' | 'people'> & { active: number; people: string }>(
    sql('warranty_schedule')
      .join('people', 'people.id', 'warranty_schedule.changed_by')
      .select('warranty_schedule.active', 'warranty_schedule.people', {
        dayOfMonth: 'day_of_month',
        changedAt: 'changed_at',
        changedBy: 'people.name',
      }),
  );
  return row && { ...row, active: row.active === 1, people: JSON.parse(row.people) as number[] };
}

/** Sets it; inside a write. */
export function writeSchedule(
  db: UnscopedDb,
  schedule: Pick<ScheduleRow, 'active' | 'dayOfMonth' | 'people'>,
  changed: { at: string; personId: number },
): void {
  const row = {
    active: schedule.active ? 1 : 0,
    day_of_month: schedule.dayOfMonth,
    people: JSON.stringify(schedule.people),
    changed_at: changed.at,
    changed_by: changed.personId,
  };
  const { changes } = db.run(sql('warranty_schedule').where({ id: 1 }).update(row));
  if (changes === 0) db.run(sql('warranty_schedule').insert({ id: 1, ...row }));
}

/** The newest run, or that of a month. */
export function findRun(db: UnscopedDb, month?: string): RunRow | undefined {
  const query = sql('warranty_runs').orderBy('month', 'desc').limit(1);
  if (month !== undefined) query.where({ month });
  return db.first<RunRow>(query.select('month', 'at', { report: 'report_id' }));
}

/** Notes a month's run; a second one of the same month breaks the write it is in. */
export function insertRun(db: UnscopedDb, run: RunRow): void {
  db.run(sql('warranty_runs').insert({ month: run.month, at: run.at, report_id: run.report }));
}

/** The mails of a month's run, in the order they were queued. */
export function mailsOfRun(db: UnscopedDb, month: string): RunMail[] {
  return db
    .all<Omit<RunMail, 'hasText'> & { hasText: number }>(
      sql('mails')
        .where({ report_run: month })
        .orderBy('id')
        .select('attempts', sql.raw(`text_body <> '' as "hasText"`), {
          to: 'recipient',
          sentAt: 'sent_at',
          nextAttemptAt: 'next_attempt_at',
          lastError: 'last_error',
        }),
    )
    .map((mail) => ({ ...mail, hasText: mail.hasText === 1 }));
}
