import type { SentJob } from '#shared/domain/normalise-job';
import type { RecordedJob } from '#shared/domain/recorded-job';

/**
 * A recorder sees no money, so what their body leaves out keeps its stored value (rule 24): findings are matched by their
 * reference, consumables by kind, agreed extras by place and day.
 */
export function keepStoredMoney(sent: SentJob, stored: RecordedJob): SentJob {
  return {
    ...sent,
    boughtInCents: sent.boughtInCents ?? stored.boughtInCents,
    findings: sent.findings?.map((finding) => ({
      ...finding,
      chargedCents:
        finding.chargedCents ??
        stored.findings?.find((known) => known.ref === finding.ref)?.chargedCents,
    })),
    consumables: sent.consumables?.map((line) => ({
      ...line,
      unitCostCents:
        line.unitCostCents ??
        stored.consumables?.find((known) => known.kind === line.kind)?.unitCostCents,
    })),
    agreedExtras: sent.agreedExtras?.map((extra, index) => {
      const known = stored.agreedExtras?.[index];
      return {
        ...extra,
        priceCents: extra.priceCents ?? (known?.on === extra.on ? known.priceCents : undefined),
      };
    }),
    invoice:
      sent.invoice && sent.invoice.totalCents === undefined
        ? { ...sent.invoice, totalCents: stored.invoice?.totalCents }
        : sent.invoice,
  };
}
