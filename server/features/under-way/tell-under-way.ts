import type { UnderWayRow } from '#db/queries/under-way';
import type { JobDraft, JobUnderWay } from '#shared/contracts/under-way';

/** A job under way as answered; to a recorder without any amount but the price quoted (rule 24). */
export function tellUnderWay(
  branch: string,
  { text, ...row }: UnderWayRow,
  money: 'seen' | 'unseen',
): JobUnderWay {
  const content = JSON.parse(text) as JobDraft;
  return { branch, ...row, content: money === 'seen' ? content : withoutMoney(content) };
}

function withoutMoney(content: JobDraft): JobDraft {
  const { boughtInCents: _bought, invoice, findings, consumables, agreedExtras, ...rest } = content;
  const { totalCents: _total, ...bill } = invoice ?? {};
  return {
    ...rest,
    ...(findings && {
      findings: findings.map(({ chargedCents: _charged, ...finding }) => finding),
    }),
    ...(consumables && {
      consumables: consumables.map(({ unitCostCents: _unit, ...line }) => line),
    }),
    ...(agreedExtras && {
      agreedExtras: agreedExtras.map(({ priceCents: _price, ...extra }) => extra),
    }),
    ...(Object.keys(bill).length > 0 && { invoice: bill }),
  };
}
