import type { ActionState, BranchMeasure } from '#shared/domain/vocabulary';
import { sql } from './database';
import { findAction, isSignal, type ActionRow } from './queries/actions';
import { recordAudit, type Actor, type Deed } from './queries/audit';
import type { ScopedBranch } from './scope';
import type { ScopedDb } from './scoped-db';
import type { Store } from './store';
import { writingReader } from './writing-reader';

/** What is agreed, by whom and until when. */
export interface AgreedAction {
  what: string;
  who: string;
  until: string;
  measure: BranchMeasure;
}

/** A person who agrees, changes or answers, and when. */
export type ActionDeed = Omit<Deed, 'subject'> & { actor: Actor & { personId: number } };

/** Writes the actions of one branch; bound to it for life. Every method runs inside `WriteQueue.write`. */
export class ActionWriter {
  private readonly reader: ScopedDb;

  constructor(
    private readonly store: Store,
    readonly branch: ScopedBranch,
  ) {
    this.reader = writingReader(store, branch);
  }

  /** An action of the branch as it stands at this moment. */
  find(id: number): ActionRow | undefined {
    return findAction(this.reader, id);
  }

  /** Whether a signal is of the branch. */
  hasSignal(id: number): boolean {
    return isSignal(this.reader, id);
  }

  agree(action: AgreedAction, on: string, signal: number | null, deed: ActionDeed): number {
    const { id } = this.store.unscoped.run(
      sql('actions').insert({
        branch_id: this.branch.id,
        what: action.what,
        who: action.who,
        until_on: action.until,
        measure: action.measure,
        state: 'agreed',
        agreed_on: on,
        agreed_at: deed.at,
        person_id: deed.actor.personId,
        signal_id: signal,
      }),
    );
    this.audit('action.agree', id, deed, { after: { ...action, signal } });
    return id;
  }

  change(
    before: ActionRow,
    after: AgreedAction & { state: ActionState },
    endedOn: string | null,
    deed: ActionDeed,
  ): void {
    this.store.unscoped.run(
      sql('actions').where({ id: before.id, branch_id: this.branch.id }).update({
        what: after.what,
        who: after.who,
        until_on: after.until,
        measure: after.measure,
        state: after.state,
        ended_on: endedOn,
      }),
    );
    const { what, who, until, measure, state } = before;
    this.audit('action.change', before.id, deed, {
      before: { what, who, until, measure, state },
      after: { ...after },
    });
  }

  answer(id: number, text: string, deed: ActionDeed): void {
    this.store.unscoped.run(
      sql('action_answers').insert({
        branch_id: this.branch.id,
        action_id: id,
        person_id: deed.actor.personId,
        at: deed.at,
        text,
      }),
    );
    this.audit('action.answer', id, deed, { after: text });
  }

  private audit(
    action: string,
    id: number,
    { actor, at }: ActionDeed,
    detail: Record<string, unknown>,
  ): void {
    recordAudit(this.store.unscoped, {
      at,
      actor,
      action,
      subject: `/branches/${this.branch.code}/actions/${id}`,
      branchId: this.branch.id,
      detail,
    });
  }
}
