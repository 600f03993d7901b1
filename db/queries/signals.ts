import type { Knex } from 'knex';
import type { Signal, SignalCar } from '#shared/contracts/signals';
import type { SignalFacts } from '#shared/domain/signal-facts';
import { SIGNAL_KINDS, type SignalKind, type SignalState } from '#shared/domain/vocabulary';
import { sql } from '../database';
import { FEWEST_OTHERS } from '../network-reference';
import type { Scope } from '../scope';
import type { ScopedDb } from '../scoped-db';

/** Where a page of signals ended. */
export interface SignalPlace {
  /** Place of its kind in the vocabulary. */
  kind: number;
  branch: string;
  id: number;
}

/** Which signals are asked for; `reach` is what the caller may see before any narrowing. */
export interface SignalFilters {
  reach: Scope;
  states: readonly SignalState[];
  kinds: readonly SignalKind[] | undefined;
}

type SignalRow = Omit<Signal, 'acknowledged' | 'facts' | 'state'> & {
  state: SignalState;
  facts: string;
  kindPlace: number;
  by: string | null;
  at: string | null;
  note: string | null;
};

const STATE = `case when s.over_on is not null then 'over' when s.acknowledged_at is not null then 'acknowledged' else 'open' end`;
const KIND_PLACE = `case s.kind ${SIGNAL_KINDS.map((kind, n) => `when '${kind}' then ${n}`).join(' ')} end`;

/** A page of signals, what can hurt somebody first, then by branch. */
export function listSignalRows(
  db: ScopedDb,
  filters: SignalFilters,
  after: SignalPlace | null,
  limit: number,
): { items: Signal[]; next: SignalPlace | null } {
  const query = told(matching(db, filters))
    .whereRaw(`${STATE} in (select value from json_each(?))`, [JSON.stringify(filters.states)])
    .orderByRaw('"kindPlace", branches.code, s.id')
    .limit(limit + 1);
  if (after) {
    query.whereRaw(`(${KIND_PLACE}, branches.code, s.id) > (?, ?, ?)`, [
      after.kind,
      after.branch,
      after.id,
    ]);
  }
  const rows = db.all<SignalRow>(query);
  const shown = rows.slice(0, limit);
  const last = rows.length > limit ? shown.at(-1) : undefined;
  return {
    items: shown.map(tellRow),
    next: last ? { kind: last.kindPlace, branch: last.branch, id: last.id } : null,
  };
}

/** How many match in each state, those of the states not asked for 0. */
export function countSignals(db: ScopedDb, filters: SignalFilters): Record<SignalState, number> {
  const rows = db.all<{ state: SignalState; n: number }>(
    matching(db, filters)
      .whereRaw(`${STATE} in (select value from json_each(?))`, [JSON.stringify(filters.states)])
      .groupByRaw('1')
      .select(sql.raw(`${STATE} as state, count(*) as n`)),
  );
  return {
    ...{ open: 0, acknowledged: 0, over: 0 },
    ...Object.fromEntries(rows.map(({ state, n }) => [state, n])),
  };
}

/** One signal of a branch, or `undefined`. */
export function findSignal(
  db: ScopedDb,
  reach: Scope,
  branch: string,
  id: number,
): Signal | undefined {
  const all: SignalFilters = { reach, states: [], kinds: undefined };
  const row = db.first<SignalRow>(
    told(matching(db, all)).where({ 's.id': id, 'branches.code': branch }),
  );
  return row && tellRow(row);
}

/** The cars that a signal lists, in its order, as they stand today; one that was voided since is not there. */
export function listSignalCars(db: ScopedDb, id: number): SignalCar[] {
  return db.all<SignalCar>(
    db
      .table('signals', 's')
      .joinRaw('cross join json_each(s.job_refs) as listed')
      .join(db.derived('jobs', 'j'), (join) =>
        join
          .on('j.branch_id', '=', 's.branch_id')
          .andOn('j.job_ref', '=', sql.raw(`listed.value ->> 'ref'`)),
      )
      .join(db.derived('job_facts', 'f'), 'f.job_id', 'j.id')
      .where('s.id', id)
      .orderByRaw('listed.key')
      .select({
        jobRef: 'f.job_ref',
        make: 'f.make',
        model: 'f.model',
        firstRegistered: 'f.first_registered',
        completedOn: 'f.completed_on',
        why: sql.raw(`listed.value ->> 'why'`),
      }),
  );
}

/** The business day of the last look at the whole network; null before the first. */
export function lastLookedOn(db: Pick<ScopedDb, 'first'>): string | null {
  return db.first<{ day: string | null }>(sql('signal_looks').max({ day: 'day' }))?.day ?? null;
}

/**
 * The signals in scope, as `s`. One that compares with the network is there only for whoever may see a network figure made of
 * the branches behind it (rules 21 and 81), judged by all that they may see.
 */
export function visibleSignals(db: ScopedDb, reach: Scope = db.scope): Knex.QueryBuilder {
  return db.table('signals', 's').whereRaw(
    `(? = 1 or s.behind is null or (select count(*) from json_each(s.behind) as other
        where other.value not in (select value from json_each(?))) >= ?)`,
    [reach.ofNetwork ? 1 : 0, reach.reachJson, FEWEST_OTHERS],
  );
}

/** Visible signals of the kinds asked for. */
function matching(db: ScopedDb, { reach, kinds }: SignalFilters): Knex.QueryBuilder {
  const query = visibleSignals(db, reach).join('branches', 'branches.id', 's.branch_id');
  if (kinds) {
    query.whereRaw('s.kind in (select value from json_each(?))', [JSON.stringify(kinds)]);
  }
  return query;
}

function told(query: Knex.QueryBuilder): Knex.QueryBuilder {
  return query
    .leftJoin('people', 'people.id', 's.acknowledged_by')
    .select(
      { id: 's.id', branch: 'branches.code', kind: 's.kind', measure: 's.measure' },
      { since: 's.since', openedOn: 's.opened_on', lastSeenOn: 's.last_seen_on' },
      { overOn: 's.over_on', strength: 's.strength', facts: 's.facts', cars: 's.cars' },
      { by: 'people.name', at: 's.acknowledged_at', note: 's.note' },
      sql.raw(`${STATE} as state, ${KIND_PLACE} as "kindPlace"`),
    );
}

function tellRow({ kindPlace: _place, by, at, note, facts, ...row }: SignalRow): Signal {
  return {
    ...row,
    facts: JSON.parse(facts) as SignalFacts,
    acknowledged: at === null ? null : { by: by ?? '', at, note: note ?? '' },
  };
}
