import { pointerPart } from '#shared/contracts/read-problems';
import type { FieldProblem } from '#shared/contracts/fields';
import type { PlannedChange } from '#shared/contracts/set-up-help';
import { FROM_THE_START, type CostChange } from '#shared/domain/cost-book';
import { feeRateMicros } from '#shared/domain/money';

/** What there is to change. */
export interface KnownSetUp {
  isBranch: (code: string) => boolean;
  isRegion: (code: string) => boolean;
  isProduct: (code: string) => boolean;
  isPackage: (code: string) => boolean;
}

/** A planned change of costs or norms as set-up would make it; `undefined` for any other. */
export function costChangeOf(planned: PlannedChange): CostChange | undefined {
  switch (planned.kind) {
    case 'rate': {
      const { branch: code, from, hourlyCostCents: value } = planned;
      return { kind: 'hourlyCost', code, from, value };
    }
    case 'productCost': {
      const { product: code, from, costPerLitreCents: value } = planned;
      return { kind: 'product', code, from, value };
    }
    case 'consumableCost': {
      const { consumable: code, from, unitCostCents: value } = planned;
      return { kind: 'consumable', code, from, value };
    }
    case 'fee': {
      const { from, feeRate } = planned;
      return { kind: 'fee', from: from ?? FROM_THE_START, value: feeRateMicros(feeRate) };
    }
    case 'norm': {
      const { package: code, bodyType, norms } = planned;
      return { kind: 'norm', package: code, bodyType, lines: norms };
    }
    default:
      return undefined;
  }
}

/** What a planned change names that is not there, over a body of any shape (rule 57). */
export function breaksOfPlan(raw: unknown, known: KnownSetUp): FieldProblem[] {
  const change = fieldOf(raw, 'change');
  const asked = [
    ['branch', known.isBranch],
    ['region', known.isRegion],
    ['product', known.isProduct],
    ['package', known.isPackage],
  ] as const;
  const problems = asked.flatMap(([field, isKnown]) =>
    missing(`/change/${field}`, fieldOf(change, field), field, isKnown),
  );
  const lines = fieldOf(change, 'norms');
  if (!Array.isArray(lines)) return problems;
  const seen = new Set<unknown>();
  lines.forEach((line: unknown, index) => {
    const product = fieldOf(line, 'product');
    const path = `/change/norms${pointerPart(index)}/product`;
    problems.push(...missing(path, product, 'product', known.isProduct));
    if (seen.has(product)) problems.push({ path, message: 'this product is in the norm already' });
    seen.add(product);
  });
  return problems;
}

function missing(
  path: string,
  code: unknown,
  word: string,
  isKnown: (code: string) => boolean,
): FieldProblem[] {
  return typeof code !== 'string' || isKnown(code)
    ? []
    : [{ path, message: `no ${word} has this code` }];
}

function fieldOf(raw: unknown, name: string): unknown {
  return typeof raw === 'object' && raw !== null
    ? (raw as Record<string, unknown>)[name]
    : undefined;
}
