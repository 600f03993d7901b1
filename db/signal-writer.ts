import type { Signal } from '#shared/contracts/signals';
import type { SignalFacts } from '#shared/domain/signal-facts';
import type { BranchMeasure, SignalKind } from '#shared/domain/vocabulary';
import { sql } from './database';
import { recordAudit, type Actor } from './queries/audit';
import { findSignal } from './queries/signals';
import type { Scope, ScopedBranch } from './scope';
import type { Store } from './store';
import { UnscopedDb } from './unscoped-db';
import { writingReader } from './writing-reader';

/** A signal as a look found it, ready to be kept. */
export interface SignalToKeep {
  branchId: number;
  kind: SignalKind;
  key: string;
  measure: BranchMeasure | null;
  since: string;
  strength: number;
  facts: SignalFacts;
  cars: number;
  listed: readonly { ref: string; why: string }[];
  behind: readonly number[] | null;
}

/** A kept signal that is not over. */
export interface KeptRow {
  id: number;
  branchId: number;
  kind: SignalKind;
  key: string;
  since: string;
}

/** What a look changed. */
export interface LookChanges {
  opened: readonly SignalToKeep[];
  kept: readonly { id: number; found: SignalToKeep }[];
  ended: readonly number[];
}

/** Keeps what looks at the whole network find; every method inside a write. */
export class LookWriter {
  private readonly db: UnscopedDb;

  constructor(store: Pick<Store, 'writing'>) {
    this.db = new UnscopedDb(store.writing);
  }

  /** Whether the look of a day is kept already. */
  hasLook(day: string): boolean {
    return this.db.first(sql('signal_looks').where({ day }).select('at')) !== undefined;
  }

  /** Every signal that is not over. */
  standing(): KeptRow[] {
    return this.db.all<KeptRow>(
      sql('signals')
        .whereNull('over_on')
        .orderBy('id')
        .select('id', 'kind', 'key', 'since', { branchId: 'branch_id' }),
    );
  }

  /** Keeps a look with all it changed; a second look of a day breaks its whole write. */
  keep(day: string, at: string, { opened, kept, ended }: LookChanges): void {
    const row = { day, at, opened: opened.length, ended: ended.length };
    this.db.run(sql('signal_looks').insert(row));
    for (const id of ended) this.db.run(sql('signals').where({ id }).update({ over_on: day }));
    for (const { id, found } of kept) {
      const { since, strength, cars } = found;
      const seen = { last_seen_on: day, since, strength, cars, ...textsOf(found) };
      this.db.run(sql('signals').where({ id }).update(seen));
    }
    for (const found of opened) {
      const { branchId, kind, key, measure, since, strength, cars } = found;
      this.db.run(
        sql('signals').insert({
          ...{ branch_id: branchId, kind, key, measure, since, strength, cars },
          ...{ opened_on: day, last_seen_on: day },
          ...textsOf(found),
        }),
      );
    }
  }
}

/** Writes what people say of one branch's signals; inside a write. */
export class SignalWriter {
  private readonly store: Pick<Store, 'writing'>;

  constructor(
    store: Pick<Store, 'writing'>,
    readonly branch: ScopedBranch,
  ) {
    this.store = store;
  }

  /** A signal as it stands at this moment, for whoever has such a reach. */
  find(id: number, reach: Scope): Signal | undefined {
    return findSignal(writingReader(this.store, this.branch), reach, this.branch.code, id);
  }

  /** Notes that a person has seen it and what is done about it, in place of what was noted before; tells the trail. */
  acknowledge(
    before: Signal,
    note: string,
    { actor, at }: { actor: Actor & { personId: number }; at: string },
  ): void {
    const db = new UnscopedDb(this.store.writing);
    db.run(
      sql('signals')
        .where({ id: before.id, branch_id: this.branch.id })
        .update({ acknowledged_by: actor.personId, acknowledged_at: at, note }),
    );
    recordAudit(db, {
      at,
      actor,
      action: 'signal.acknowledge',
      subject: `/branches/${this.branch.code}/signals/${before.id}`,
      branchId: this.branch.id,
      detail: { kind: before.kind, before: before.acknowledged?.note ?? null, after: note },
    });
  }
}

function textsOf({ facts, listed, behind }: SignalToKeep): Record<string, string | null> {
  return {
    facts: JSON.stringify(facts),
    job_refs: JSON.stringify(listed),
    behind: behind && JSON.stringify(behind),
  };
}
