/** What of a job, finished or under way, may hold money. */
export interface Moneyed {
  boughtInCents?: number;
  findings?: readonly { ref?: string; chargedCents?: number }[];
  consumables?: readonly { kind: string; unitCostCents?: number }[];
  agreedExtras?: readonly { on: string; priceCents?: number }[];
  invoice?: { totalCents?: number } | null;
}

/**
 * A recorder sees no money, so what their body leaves out keeps its stored value (rule 24): findings are matched by their
 * reference, consumables by kind, agreed extras by day; several of one kind or day in their order.
 */
export function keepStoredMoney<Sent extends Moneyed>(sent: Sent, stored: Moneyed): Sent {
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

/**
 * The same where the money stands in a job under way, of which a recorder sees the whole bill but its total: left out, the
 * total stays.
 */
export function keepMoneyUnderWay<Sent extends Moneyed>(sent: Sent, underWay: Moneyed): Sent {
  const kept = keepStoredMoney(sent, underWay);
  const totalCents = underWay.invoice?.totalCents;
  return kept.invoice === undefined && totalCents !== undefined
    ? { ...kept, invoice: { totalCents } }
    : kept;
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
