import type { FactsByKind } from '#shared/domain/signal-facts';
import { plainSignal, type CarBehind, type FoundSignal } from './found-signal';

/** Dangerous rot left on cars of a branch (rule 61) that still stands open and has a day set, the earliest day first. */
export interface DangersLeft {
  branchId: number;
  today: string;
  findings: readonly { ref: string; dueOn: string; ownerToldOn: string | null }[];
}

/** Dangerous come-backs whose day has passed: it can hurt somebody, so it comes before everything else. */
export function detectComeBacksDue({ branchId, today, findings }: DangersLeft): FoundSignal[] {
  const due = findings.filter(({ dueOn }) => dueOn < today);
  const oldest = due[0];
  if (!oldest) return [];
  const listed = new Map<string, CarBehind>();
  for (const { ref, dueOn, ownerToldOn } of due) {
    const why = `was due on ${dueOn}${ownerToldOn === null ? '; not noted that the owner was told' : ''}`;
    if (!listed.has(ref)) listed.set(ref, { ref, why });
  }
  const facts: FactsByKind['come_backs_due'] = {
    findings: due.length,
    oldestDueOn: oldest.dueOn,
    notTold: due.filter(({ ownerToldOn }) => ownerToldOn === null).length,
  };
  return [
    plainSignal({
      branchId,
      kind: 'come_backs_due',
      key: 'due',
      since: oldest.dueOn,
      strength: due.length,
      facts: { ...facts },
      cars: listed.size,
      listed: [...listed.values()],
    }),
  ];
}
