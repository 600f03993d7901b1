/** What one row of cars has cost and is still to cost, in minor units. */
export interface PaidCellInput {
  readonly paid: number;
  readonly toCome: number;
  /** Half of the 95 % interval of what is to come; null where it is not known. */
  readonly giveOrTake: number | null;
}
