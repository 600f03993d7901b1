import type { BodyType, ConsumableKind } from './vocabulary';

/** A value valid from a date on, until the next one. */
export interface Dated {
  from: string;
  value: number;
}

export interface NormLine {
  product: string;
  ml: number;
}

/** A change of one dated cost or one norm, as set-up makes it. */
export type CostChange =
  | { kind: 'hourlyCost'; code: string; from: string; value: number }
  | { kind: 'product'; code: string; from: string; value: number }
  | { kind: 'consumable'; code: ConsumableKind; from: string; value: number }
  | { kind: 'fee'; from: string; value: number }
  | { kind: 'norm'; package: string; bodyType: BodyType; lines: NormLine[] };

type DatedKind = 'hourlyCost' | 'product' | 'consumable' | 'fee';

/** The first day there is: what the base fee rate of the network is valid from. */
export const FROM_THE_START = '0000-01-01';
/** The code under which the network's fee is kept. */
const NETWORK = 'network';

/**
 * Every dated cost and every norm of the network at one moment. Immutable: `with` gives the book after a change, so that a
 * restatement can compute with the next book while the present one still answers.
 *
 * Units: hourly cost in cents an hour, product in cents a litre, consumable in cents a piece, fee in millionths of revenue.
 */
export class CostBook {
  private constructor(
    private readonly dated: ReadonlyMap<string, readonly Dated[]>,
    private readonly norms: ReadonlyMap<string, readonly NormLine[]>,
  ) {}

  static readonly empty = new CostBook(new Map(), new Map());

  /** The book that holds exactly these changes, made at once. */
  static of(changes: Iterable<CostChange>): CostBook {
    const dated = new Map<string, Dated[]>();
    const norms = new Map<string, readonly NormLine[]>();
    for (const change of changes) {
      if (change.kind === 'norm') enterNorm(norms, change);
      else {
        const key = datedKey(change.kind, codeOf(change));
        dated.set(key, entered(dated.get(key) ?? [], change));
      }
    }
    return new CostBook(dated, norms);
  }

  /** The book after one more change. */
  with(change: CostChange): CostBook {
    if (change.kind === 'norm') {
      const norms = new Map(this.norms);
      enterNorm(norms, change);
      return new CostBook(this.dated, norms);
    }
    const dated = new Map(this.dated);
    const key = datedKey(change.kind, codeOf(change));
    dated.set(key, entered(dated.get(key) ?? [], change));
    return new CostBook(dated, this.norms);
  }

  hourlyCost(branch: string, on: string): number | undefined {
    return this.valid('hourlyCost', branch, on);
  }

  productCost(product: string, on: string): number | undefined {
    return this.valid('product', product, on);
  }

  consumableCost(kind: ConsumableKind, on: string): number | undefined {
    return this.valid('consumable', kind, on);
  }

  feeMicros(on: string): number | undefined {
    return this.valid('fee', NETWORK, on);
  }

  /** Expected product for a package on a body type, or `undefined` when no norm is set. */
  norm(packageCode: string, bodyType: BodyType): readonly NormLine[] | undefined {
    return this.norms.get(normKey(packageCode, bodyType));
  }

  /** The dates between which a dated change has effect: from its own to the day before the next entry (null: open). */
  reach(change: Exclude<CostChange, { kind: 'norm' }>): { from: string; before: string | null } {
    const entries = this.dated.get(datedKey(change.kind, codeOf(change))) ?? [];
    const next = entries.find((entry) => entry.from > change.from);
    return { from: change.from, before: next?.from ?? null };
  }

  private valid(kind: DatedKind, code: string, on: string): number | undefined {
    const entries = this.dated.get(datedKey(kind, code));
    if (!entries) return undefined;
    for (let index = entries.length - 1; index >= 0; index -= 1) {
      const entry = entries[index] as Dated;
      if (entry.from <= on) return entry.value;
    }
    return undefined;
  }
}

function codeOf(change: Exclude<CostChange, { kind: 'norm' }>): string {
  return change.kind === 'fee' ? NETWORK : change.code;
}

function datedKey(kind: DatedKind, code: string): string {
  return `${kind} ${code}`;
}

function normKey(packageCode: string, bodyType: string): string {
  return `${packageCode} ${bodyType}`;
}

/** Lines in the order of their products, whatever the order sent: a book must not depend on how it came about. */
function enterNorm(
  norms: Map<string, readonly NormLine[]>,
  change: Extract<CostChange, { kind: 'norm' }>,
): void {
  const key = normKey(change.package, change.bodyType);
  if (change.lines.length === 0) norms.delete(key);
  else
    norms.set(
      key,
      [...change.lines].sort((a, b) => (a.product < b.product ? -1 : 1)),
    );
}

function entered(entries: readonly Dated[], change: Dated): Dated[] {
  return [
    ...entries.filter((entry) => entry.from !== change.from),
    { from: change.from, value: change.value },
  ].sort((a, b) => (a.from < b.from ? -1 : 1));
}
