import type { PaidCellInput } from './paid-cell-input';

/** The parts of a bar in per cent of the cell. */
export interface PaidCellLayout {
  readonly paid: number;
  readonly toCome: number;
  readonly whisker: { readonly from: number; readonly to: number } | null;
}

/** The most that any of the bars reaches, whiskers included; at least 1, so that there is a scale where nothing was paid. */
export function paidReach(rows: readonly PaidCellInput[]): number {
  return Math.max(
    1,
    ...rows.map(({ paid, toCome, giveOrTake }) => paid + toCome + (giveOrTake ?? 0)),
  );
}

/** Places paid, to come and its whisker on a scale that all rows share. */
export function layOutPaidCell(
  { paid, toCome, giveOrTake }: PaidCellInput,
  reach: number,
): PaidCellLayout {
  const share = (cents: number): number => (Math.max(0, Math.min(cents, reach)) / reach) * 100;
  const all = paid + toCome;
  return {
    paid: share(paid),
    toCome: share(toCome),
    whisker:
      giveOrTake === null || giveOrTake === 0
        ? null
        : { from: share(all - giveOrTake), to: share(all + giveOrTake) },
  };
}
