import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { formatCount, formatShare, formatShareRange } from '../../../ui/format';
import { groupWords, NO_FIGURE } from '../report-words';
import { number, type PaperRows, words } from './paper-rows';

type Month = WarrantyAnswer['claimFree'][number];

/** Cars still without a claim after every year since they were finished, and after the last month that can be told: all, then each group. */
export function claimFreeRows({ claimFree, groups }: WarrantyAnswer): PaperRows {
  return {
    columns: [
      words('Cars'),
      number('Months'),
      number('At risk'),
      number('With a claim so far'),
      number('Without a claim'),
      number('95 % interval'),
    ],
    rows: [
      ...rowsOf('all', claimFree),
      ...groups.flatMap(({ key, months }) => rowsOf(groupWords(key), months)),
    ],
  };
}

function rowsOf(name: string, months: readonly Month[]): string[][] {
  const last = months.filter(({ share }) => share !== null).at(-1);
  let claims = 0;
  const rows: string[][] = [];
  for (const each of months) {
    claims += each.claims;
    if (each.share === null || (each.month % 12 !== 0 && each !== last)) continue;
    rows.push([
      name,
      formatCount(each.month),
      formatCount(each.atRisk),
      formatCount(claims),
      formatShare(each.share, 1),
      each.lower === null || each.upper === null
        ? NO_FIGURE
        : formatShareRange(each.lower, each.upper, 1),
    ]);
  }
  return rows;
}
