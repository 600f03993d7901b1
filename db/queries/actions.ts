import type { ActionState, BranchMeasure } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { ScopedDb } from '../scoped-db';
import { visibleSignals } from './signals';

/** An action as it stands, with what the branch has answered. */
export interface ActionRow {
  id: number;
  branch: string;
  branchId: number;
  what: string;
  who: string;
  until: string;
  measure: BranchMeasure;
  state: ActionState;
  agreedOn: string;
  agreedBy: string;
  endedOn: string | null;
  signal: number | null;
  /** JSON list of `{by, at, text}`, oldest first. */
  answers: string;
}

/** Where a list goes on: those under way by the day they are due, then the ended ones by the day they ended. */
export interface ActionPlace {
  /** 0 under way, 1 ended. */
  ended: number;
  /** What it is ordered by within that: a day, or days that count backwards. */
  key: string;
  id: number;
}

export interface ActionFilters {
  states: readonly ActionState[];
}

const ENDED = `(actions.state <> 'agreed')`;
/** The newest ended first: days of a calendar as text, counted down from the last that can be written. */
const KEY = `case when actions.state = 'agreed' then actions.until_on
  else printf('%08d', 99999999 - cast(replace(actions.ended_on, '-', '') as integer)) end`;

/** A page of actions, those under way first, the earliest due first; then the ended, the newest first. */
export function listActionRows(
  db: ScopedDb,
  { states }: ActionFilters,
  after: ActionPlace | null,
  limit: number,
): (ActionRow & ActionPlace)[] {
  const query = told(db)
    .whereRaw('actions.state in (select value from json_each(?))', [JSON.stringify(states)])
    .orderByRaw(`${ENDED}, ${KEY}, actions.id`)
    .limit(limit)
    .select(sql.raw(`${ENDED} as ended, ${KEY} as key`));
  if (after) {
    query.whereRaw(`(${ENDED}, ${KEY}, actions.id) > (?, ?, ?)`, [
      after.ended,
      after.key,
      after.id,
    ]);
  }
  return db.all(query);
}

/** One action, or `undefined`. */
export function findAction(db: ScopedDb, id: number): ActionRow | undefined {
  return db.first<ActionRow>(told(db).where('actions.id', id));
}

/** How many there are of each state, and of those under way how many are past their day. */
export function countActions(
  db: ScopedDb,
  { states }: ActionFilters,
  today: string,
): { agreed: number; late: number; done: number; dropped: number } {
  const row = db.first<{ agreed: number; late: number; done: number; dropped: number }>(
    db
      .table('actions')
      .whereRaw('state in (select value from json_each(?))', [JSON.stringify(states)])
      .select(
        sql.raw(
          `coalesce(sum(state = 'agreed'), 0) as agreed,
            coalesce(sum(state = 'agreed' and until_on < ?), 0) as late,
            coalesce(sum(state = 'done'), 0) as done, coalesce(sum(state = 'dropped'), 0) as dropped`,
          [today],
        ),
      ),
  );
  return row ?? { agreed: 0, late: 0, done: 0, dropped: 0 };
}

/** Whether a signal is of the scope. */
export function isSignal(db: ScopedDb, id: number): boolean {
  return db.first(visibleSignals(db).where('s.id', id).select('s.id')) !== undefined;
}

function told(db: ScopedDb) {
  const answers = sql
    .from(db.derived('action_answers', 'answers'))
    .join('people as answering', 'answering.id', 'answers.person_id')
    .whereRaw('answers.action_id = actions.id')
    .select(
      sql.raw(
        `json_group_array(json_object('by', answering.name, 'at', answers.at, 'text', answers.text)
          order by answers.id)`,
      ),
    );
  return db
    .table('actions')
    .join('branches', 'branches.id', 'actions.branch_id')
    .join('people as agreeing', 'agreeing.id', 'actions.person_id')
    .select(
      {
        id: 'actions.id',
        branch: 'branches.code',
        branchId: 'actions.branch_id',
        what: 'actions.what',
        who: 'actions.who',
        until: 'actions.until_on',
        measure: 'actions.measure',
        state: 'actions.state',
        agreedOn: 'actions.agreed_on',
        agreedBy: 'agreeing.name',
        endedOn: 'actions.ended_on',
        signal: 'actions.signal_id',
      },
      answers.as('answers'),
    );
}
