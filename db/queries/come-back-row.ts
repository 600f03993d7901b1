import type { ComeBack } from '#shared/contracts/come-back';
import type { BodyType, ComeBackStatus, Condition, Side, Zone } from '#shared/domain/vocabulary';

/** A finding left on a car as it is read, before it is told. */
export interface ComeBackRow {
  job_id: number;
  branch: string;
  job_ref: string;
  ref: string;
  vehicle_key: string | null;
  make: string;
  model: string;
  body_type: BodyType;
  first_registered: string;
  zone: Zone;
  side: Side;
  seen_as: Condition;
  worked_as: Condition | null;
  structural: number;
  action: 'deferred' | 'declined';
  completed_on: string;
  /** How it stands, all considered; `mark_status` is what a person said. */
  status: ComeBackStatus;
  mark_status: ComeBackStatus | null;
  /** Of its newest mark; null without one. */
  revision: number | null;
  due_on: string | null;
  note: string | null;
  owner_told_on: string | null;
  changed_by: string | null;
  changed_at: string | null;
  closed_by: string | null;
  danger: number;
  place: number;
}

/** A finding left on a car as every answer tells it; nothing of it is money, so it is the same for every role. */
export function tellComeBack(row: ComeBackRow): ComeBack {
  return {
    branch: row.branch,
    jobRef: row.job_ref,
    ref: row.ref,
    vehicle: {
      ...(row.vehicle_key !== null && { key: row.vehicle_key }),
      make: row.make,
      model: row.model,
      bodyType: row.body_type,
      firstRegistered: row.first_registered,
    },
    zone: row.zone,
    side: row.side,
    seenAs: row.seen_as,
    workedAs: row.worked_as,
    structural: row.structural === 1,
    action: row.action,
    completedOn: row.completed_on,
    status: row.status,
    dueOn: row.due_on,
    note: row.note ?? '',
    ownerToldOn: row.owner_told_on,
    changedBy: row.changed_by,
    changedAt: row.changed_at,
    // A car that is gone was closed by a person, whatever came later.
    closedByJobRef: row.status === 'done' ? row.closed_by : null,
  };
}
