import type { LaterArrival } from '#shared/contracts/warranty-reports';
import { formatExactMoney, formatInstant, formatShortDate } from '../../ui/format';

const DEEDS: Readonly<Record<LaterArrival['what'], string>> = {
  new: 'new',
  corrected: 'corrected',
  voided: 'voided',
  restored: 'brought back',
};

/** One later arrival as it is listed, with where it leads. */
export interface LaterRow {
  readonly name: string;
  readonly link: readonly string[];
  readonly about: string;
  readonly received: string;
}

/** What arrived, where it belongs, when it came and from whom. */
export function laterRow(
  arrival: LaterArrival,
  { currency, branch }: { readonly currency: string; readonly branch: string },
): LaterRow {
  const { kind, ref, jobRef, what, on, at, by, costCents } = arrival;
  const day = formatShortDate(on);
  const about =
    kind === 'job'
      ? `${branch}: ${DEEDS[what]}, finished ${day}`
      : [
          `${branch}, on job ${jobRef}: ${DEEDS[what]}, made ${day}`,
          ...(costCents === null ? [] : [`costs ${formatExactMoney(costCents, currency)}`]),
        ].join(', ');
  return {
    name: kind === 'job' ? `Job ${ref}` : `Claim ${ref}`,
    link: [kind === 'job' ? '/jobs' : '/claims', arrival.branch, ref],
    about,
    received: `Received ${formatInstant(at)} from ${by}`,
  };
}
