import { daysBetween } from '#shared/domain/calendar';
import type { FactsByKind } from '#shared/domain/signal-facts';
import { plainSignal, type FoundSignal } from './found-signal';

/** Days that a bill may take: longer waits are forgotten rather than late. */
export const BILL_DAYS = 14;

/** Finished cars of a branch without an invoice, oldest first. */
export interface UnbilledCars {
  branchId: number;
  today: string;
  currency: string;
  /** `costCents` null where a cost is not known (rule 11). */
  cars: readonly { ref: string; completedOn: string; costCents: number | null }[];
}

/** Cars that wait for their bill for more than 14 days: one signal a branch. */
export function detectUnbilled({ branchId, today, currency, cars }: UnbilledCars): FoundSignal[] {
  const waiting = cars.filter(({ completedOn }) => daysBetween(completedOn, today) > BILL_DAYS);
  const oldest = waiting[0];
  if (!oldest) return [];
  const facts: FactsByKind['unbilled'] = {
    oldestOn: oldest.completedOn,
    oldestDays: daysBetween(oldest.completedOn, today),
    costCents: waiting.reduce((sum, { costCents }) => sum + (costCents ?? 0), 0),
    withoutCost: waiting.filter(({ costCents }) => costCents === null).length,
    currency,
  };
  return [
    plainSignal({
      branchId,
      kind: 'unbilled',
      key: 'unbilled',
      since: oldest.completedOn,
      strength: waiting.length,
      facts: { ...facts },
      cars: waiting.length,
      listed: waiting.map(({ ref, completedOn }) => ({
        ref,
        why: `waits ${daysBetween(completedOn, today)} days`,
      })),
    }),
  ];
}
