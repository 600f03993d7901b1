import type { SentJob } from './normalise-job';
import type { RecordedJob } from './recorded-job';

/**
 * A recorder sees no money, so what their body leaves out keeps its stored value (rule 24): findings are matched by their
 * reference, consumables by kind, agreed extras by day; several of one kind or day in their order.
 */
export function keepStoredMoney(sent: SentJob, stored: RecordedJob): SentJob {
  const findings = new Map(stored.findings?.map((known) => [known.ref, known]));
  const consumables = takeInOrder(stored.consumables ?? [], ({ kind }) => kind);
  const extras = takeInOrder(stored.agreedExtras ?? [], ({ on }) => on);
  return {
    ...sent,
    boughtInCents: sent.boughtInCents ?? stored.boughtInCents,
    findings: sent.findings?.map((finding) => ({
      ...finding,
      chargedCents: finding.chargedCents ?? findings.get(finding.ref ?? '')?.chargedCents,
    })),
    consumables: sent.consumables?.map((line) => {
      const known = consumables.next(line.kind) ?? consumables.last(line.kind);
      return { ...line, unitCostCents: line.unitCostCents ?? known?.unitCostCents };
    }),
    agreedExtras: sent.agreedExtras?.map((extra) => {
      const known = extras.next(extra.on);
      return { ...extra, priceCents: extra.priceCents ?? known?.priceCents };
    }),
    invoice:
      sent.invoice && sent.invoice.totalCents === undefined
        ? { ...sent.invoice, totalCents: stored.invoice?.totalCents }
        : sent.invoice,
  };
}

/** Hands out the items of each key one after another; `last` is the last of a key, for one more than there were. */
function takeInOrder<T>(
  items: readonly T[],
  keyOf: (item: T) => string,
): { next: (key: string) => T | undefined; last: (key: string) => T | undefined } {
  const taken = new Map<string, number>();
  const ofKey = (key: string): T[] => items.filter((item) => keyOf(item) === key);
  return {
    next: (key) => {
      const index = taken.get(key) ?? 0;
      taken.set(key, index + 1);
      return ofKey(key)[index];
    },
    last: (key) => ofKey(key).at(-1),
  };
}
