import { sql } from '../database';
import type { ScopedBranch } from '../scope';
import type { ScopedDb } from '../scoped-db';
import type { UnscopedDb } from '../unscoped-db';

export interface WeekNoteRow {
  branch: string;
  week: string;
  text: string;
  by: string;
  changedAt: string;
}

/** Notes in scope on the weeks between two, newest week first. */
export function listWeekNotes(db: ScopedDb, fromWeek: string, toWeek: string): WeekNoteRow[] {
  return db.all<WeekNoteRow>(
    db
      .table('week_notes')
      .join('branches', 'branches.id', 'week_notes.branch_id')
      .join('people', 'people.id', 'week_notes.person_id')
      .whereBetween('week', [fromWeek, toWeek])
      .orderBy([{ column: 'week', order: 'desc' }, { column: 'branches.code' }])
      .select({
        branch: 'branches.code',
        week: 'week',
        text: 'text',
        by: 'people.name',
        changedAt: 'changed_at',
      }),
  );
}

/** The text of a branch's note on a week, or null; inside a write. */
export function findWeekNote(db: UnscopedDb, branch: ScopedBranch, week: string): string | null {
  const row = db.first<{ text: string }>(
    sql('week_notes').where({ branch_id: branch.id, week }).select('text'),
  );
  return row?.text ?? null;
}

/** Writes a note, or removes it when the text is empty; inside a write. */
export function putWeekNoteRow(
  db: UnscopedDb,
  branch: ScopedBranch,
  note: { week: string; text: string; personId: number; changedAt: string },
): void {
  const key = { branch_id: branch.id, week: note.week };
  db.run(sql('week_notes').where(key).delete());
  if (note.text === '') return;
  db.run(
    sql('week_notes').insert({
      ...key,
      text: note.text,
      person_id: note.personId,
      changed_at: note.changedAt,
    }),
  );
}
