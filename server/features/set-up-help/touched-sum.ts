import { MOVED_FIGURES, type Effect } from '#shared/contracts/set-up-help';
import type { CostBook, CostChange } from '#shared/domain/cost-book';
import { marginCents, type JobFigures } from '#shared/domain/job-figures';

type Figure = Effect['figures'][number];

/** Adds up the cars whose figures a change moves, and what they keep before and after it. */
export class TouchedSum {
  private jobs = 0;
  private from: string | null = null;
  private to: string | null = null;
  private readonly branches = new Set<string>();
  private readonly figures = new Set<Figure>();
  private before = 0;
  private after = 0;

  /** Takes a car as it is now and as it would be; one that stays the same is passed over. */
  add(branch: string, completedOn: string, now: JobFigures, then: JobFigures): void {
    const money = differs(now.money, then.money);
    const expected = differs(now.expected, then.expected);
    if (!money && !expected && !differs(restOf(now), restOf(then))) return;
    this.jobs += 1;
    this.branches.add(branch);
    if (this.from === null || completedOn < this.from) this.from = completedOn;
    if (this.to === null || completedOn > this.to) this.to = completedOn;
    if (money) this.figures.add('margin');
    if (expected) this.figures.add('expected_margin');
    // The bridge is over billed cars that have both (rule 2).
    if (now.billed && (isBridged(now) || isBridged(then))) this.figures.add('bridge');
    this.before += keptBy(now);
    this.after += keptBy(then);
  }

  /** What was added, with the figures that move whatever the cars. */
  told(kind: CostChange['kind'], others: readonly Figure[]): Effect {
    const figures = new Set([...this.figures, ...others]);
    if (kind === 'norm' && this.jobs > 0) figures.add('product_against_norm');
    return {
      jobs: this.jobs,
      branches: this.branches.size,
      from: this.from,
      to: this.to,
      marginCents: this.figures.has('margin') ? { before: this.before, after: this.after } : null,
      figures: MOVED_FIGURES.filter((figure) => figures.has(figure)),
    };
  }
}

/** Figures that are computed at the costs and norms of today: quotes, and the need of the coming weeks. */
export function figuresOfDay(
  change: CostChange,
  costs: CostBook,
  next: CostBook,
  today: string,
): Figure[] {
  const held = (book: CostBook): unknown => {
    switch (change.kind) {
      case 'hourlyCost':
        return book.hourlyCost(change.code, today);
      case 'product':
        return book.productCost(change.code, today);
      case 'consumable':
        return book.consumableCost(change.code, today);
      case 'fee':
        return book.feeMicros(today);
      case 'norm':
        return book.norm(change.package, change.bodyType);
    }
  };
  if (!differs(held(costs), held(next))) return [];
  switch (change.kind) {
    case 'norm':
      return ['product_need'];
    case 'product':
      return ['quote_price', 'product_need'];
    default:
      return ['quote_price'];
  }
}

function isBridged({ money, expected }: JobFigures): boolean {
  return money !== undefined && expected !== undefined;
}

/** What a car keeps as far as it is counted: billed, and every cost known. */
function keptBy({ billed, money }: JobFigures): number {
  return billed && money ? marginCents(money) : 0;
}

/** Everything else that a job's rows hold of costs and norms. */
function restOf({ products, normMl, normedMl, missing }: JobFigures): unknown {
  return [[...products], normMl, normedMl, missing];
}

function differs(a: unknown, b: unknown): boolean {
  return JSON.stringify(a) !== JSON.stringify(b);
}
