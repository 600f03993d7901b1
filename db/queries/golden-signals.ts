import type { ScopedDb } from '../scoped-db';
import { countSignals, listSignalCars, listSignalRows } from './signals';
import { listDangersDue, readArrivals } from './signals-arrivals';
import {
  listBilledCars,
  listCheckedCars,
  listMovingCars,
  listUnbilledBefore,
  readTimedCars,
} from './signals-cars';

const PERIOD = { from: '2026-01-05', to: '2026-01-11' };

/** What signals read, as `golden.spec.ts` asks it. */
export const SIGNAL_READS: Readonly<Record<string, (db: ScopedDb) => unknown>> = {
  'list-billed-cars': (db) => listBilledCars(db, 1, PERIOD, 200),
  'list-checked-cars': (db) => listCheckedCars(db, PERIOD.from, PERIOD.to),
  'list-dangers-due': (db) => listDangersDue(db, PERIOD.to),
  'list-moving-cars': (db) =>
    listMovingCars(db, 1, 'overrun', { ...PERIOD, side: 'high', claimed: [] }, 200),
  'list-signal-cars': (db) => listSignalCars(db, 1),
  'list-signals-after-a-place': (db) =>
    listSignalRows(
      db,
      { reach: db.scope, states: ['open'], kinds: ['silence'] },
      { kind: 1, branch: 'AAA', id: 1 },
      50,
    ),
  'count-signals': (db) =>
    countSignals(db, { reach: db.scope, states: ['open'], kinds: undefined }),
  'list-unbilled-before': (db) => listUnbilledBefore(db, PERIOD.to),
  'read-arrivals': (db) => readArrivals(db, PERIOD.from),
  'read-timed-cars': (db) => readTimedCars(db, PERIOD.from, PERIOD.to),
};
