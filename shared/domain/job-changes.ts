import { differences, flatFields, pointerStep, type Difference, type Leaf } from './flat-fields';
import { normaliseJob } from './normalise-job';
import type { RecordedJob } from './recorded-job';

/** Amounts that a recorder does not see (rule 24): everything but the price quoted. */
const MONEY =
  /^\/(?:boughtInCents|invoice\/totalCents|(?:agreedExtras|consumables|findings)\/[^/]+\/(?:priceCents|unitCostCents|chargedCents))$/;

/**
 * What differs between two contents of a job, field by field. Findings are matched by their reference, products and consumables
 * by their code and kind (the second of one is `CW1:2`), agreed extras by place. A default and its absence are the same (rule
 * 25), so that 0, "" and an empty list show no change.
 */
export function jobChanges(
  before: RecordedJob | undefined,
  after: RecordedJob,
  money: 'seen' | 'unseen' = 'seen',
): Difference[] {
  const changes = differences(before ? fieldsOf(before) : new Map<string, Leaf>(), fieldsOf(after));
  return money === 'seen' ? changes : changes.filter(({ path }) => !MONEY.test(path));
}

function fieldsOf(job: RecordedJob): Map<string, Leaf> {
  const { findings, products, consumables, ...rest } = normaliseJob(job);
  return new Map([
    ...flatFields(rest),
    ...keyed('/products', products, ({ product }) => product),
    ...keyed('/consumables', consumables, ({ kind }) => kind),
    ...keyed('/findings', findings, ({ ref }) => ref),
  ]);
}

function keyed<Item>(
  path: string,
  items: readonly Item[] = [],
  keyOf: (item: Item) => string,
): [string, Leaf][] {
  const seen = new Map<string, number>();
  return items.flatMap((item) => {
    const key = keyOf(item);
    const count = (seen.get(key) ?? 0) + 1;
    seen.set(key, count);
    const step = pointerStep(count === 1 ? key : `${key}:${count}`);
    return [...flatFields(item, path + step)];
  });
}
