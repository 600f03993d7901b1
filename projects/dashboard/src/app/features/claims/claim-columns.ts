import type { ClaimRow } from '#shared/contracts/claim-list';
import { claimLink, claimPlace, uncountedWords } from '../../ui/claims/claim-words';
import type { Column } from '../../ui/data-table/column';
import { formatAmount, formatShortDate } from '../../ui/format';
import { CLAIM_CAUSE_NAMES, CLAIM_DECISION_NAMES } from '../../ui/words';

/** What the columns of the list need to know beside the row. */
export interface ClaimColumnsInput {
  readonly branchName: (code: string) => string;
  readonly branches: 'one' | 'several';
  /** Recorders see no money. */
  readonly money: 'shown' | 'hidden';
}

/** Make, model and the year of first registration. */
export function carWords({ vehicle }: ClaimRow): { readonly name: string; readonly year: string } {
  return {
    name: `${vehicle.make} ${vehicle.model}`,
    year: vehicle.firstRegistered.slice(0, 4),
  };
}

/** The month since completion in which it was made; before it, none. */
export function monthWords({ month }: ClaimRow): string {
  return month > 0 ? `month ${month}` : '';
}

/** The columns of the list of claims. */
export function claimColumns(known: ClaimColumnsInput): readonly Column<ClaimRow>[] {
  const branch: Column<ClaimRow> = {
    key: 'branch',
    label: 'Branch',
    text: (row) => known.branchName(row.branch),
  };
  return [
    {
      key: 'claim',
      label: 'Claim',
      text: (row) => row.claimRef,
      link: (row) => ({ commands: claimLink(row) }),
    },
    ...(known.branches === 'several' ? [branch] : []),
    {
      key: 'car',
      label: 'Car',
      text: (row) => carWords(row).name,
      quiet: (row) => carWords(row).year,
    },
    {
      key: 'job',
      label: 'Job',
      text: (row) => row.jobRef,
      link: (row) => ({ commands: ['/jobs', row.branch, row.jobRef] }),
    },
    {
      key: 'made',
      label: 'Made',
      text: (row) => formatShortDate(row.madeOn),
      quiet: monthWords,
    },
    { key: 'where', label: 'Where', text: (row) => claimPlace(row.zone, row.side) },
    { key: 'cause', label: 'Cause', text: (row) => CLAIM_CAUSE_NAMES[row.cause] },
    {
      key: 'decision',
      label: 'Decision',
      text: (row) => CLAIM_DECISION_NAMES[row.decision],
    },
    {
      key: 'counts',
      label: 'Counts',
      text: (row) => (row.counted ? 'yes' : 'no'),
      quiet: uncountedWords,
    },
    ...(known.money === 'shown' ? [COST] : []),
  ];
}

const COST: Column<ClaimRow> = {
  key: 'cost',
  label: 'Cost',
  kind: 'number',
  text: (row) => (row.costCents ? formatAmount(row.costCents) : ''),
  quiet: (row) => (row.paidOn ? 'paid' : undefined),
};
