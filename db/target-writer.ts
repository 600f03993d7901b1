import type { TargetMeasure } from '#shared/domain/target-measures';
import { sql } from './database';
import { recordAudit, type Deed } from './queries/audit';
import { readTargets, type Targets } from './queries/targets';
import type { ScopedBranch } from './scope';
import type { Store } from './store';
import { writingReader } from './writing-reader';

/** Sets the targets of one branch; bound to it for life. Every method runs inside `WriteQueue.write`. */
export class TargetWriter {
  constructor(
    private readonly store: Store,
    readonly branch: ScopedBranch,
  ) {}

  /** Sets or takes away (null) a target of the branch; the same again writes nothing. Gives what holds from now on. */
  set(measure: TargetMeasure, value: number | null, deed: Deed): Targets {
    const before = this.read().own(this.branch.id, measure);
    if (value !== before) {
      this.put(measure, value);
      recordAudit(this.store.unscoped, {
        ...deed,
        action: 'target.branch',
        branchId: this.branch.id,
        detail: { before: { [measure]: before }, after: { [measure]: value } },
      });
    }
    return this.read();
  }

  private put(measure: TargetMeasure, value: number | null): void {
    const { unscoped } = this.store;
    if (measure === 'margin') {
      // Where quotes read it (rule 80).
      unscoped.run(
        sql('branches').where({ id: this.branch.id }).update({ target_margin_share: value }),
      );
      return;
    }
    const key = { branch_id: this.branch.id, measure };
    unscoped.run(sql('branch_targets').where(key).delete());
    if (value !== null) unscoped.run(sql('branch_targets').insert({ ...key, value }));
  }

  private read(): Targets {
    return readTargets(writingReader(this.store, this.branch));
  }
}

/** Sets or takes away (null) a target of the network; inside a write. */
export function setNetworkTarget(
  store: Store,
  measure: TargetMeasure,
  value: number | null,
  deed: Deed,
): void {
  const { unscoped } = store;
  const before =
    measure === 'margin'
      ? unscoped.first<{ value: number | null }>(
          sql('network').select({ value: 'target_margin_share' }),
        )?.value
      : unscoped.first<{ value: number }>(sql('network_targets').where({ measure }).select('value'))
          ?.value;
  if (value === (before ?? null)) return;
  if (measure === 'margin') {
    unscoped.run(sql('network').update({ target_margin_share: value }));
  } else {
    unscoped.run(sql('network_targets').where({ measure }).delete());
    if (value !== null) unscoped.run(sql('network_targets').insert({ measure, value }));
  }
  recordAudit(unscoped, {
    ...deed,
    action: 'target.network',
    branchId: null,
    detail: { before: { [measure]: before ?? null }, after: { [measure]: value } },
  });
}
