import type { WarrantyAnswer } from '#shared/contracts/warranty';
import { formatCount, formatNumber } from '../../../ui/format';
import { expectedWords, groupWords } from '../report-words';

/** What the log-rank test says of the groups, with the sums it is made of; nothing where there is nothing to compare. */
export function logRankWords({ logRank }: WarrantyAnswer): string {
  if (!logRank) return '';
  const { chiSquare, degreesOfFreedom, p, groups } = logRank;
  const sums = groups
    .map(
      ({ key, observed, expected }) =>
        `${groupWords(key)} ${formatCount(observed)} / ${expectedWords(expected)}`,
    )
    .join(', ');
  return `Log-rank test: χ² ${formatNumber(chiSquare, 2)} on ${degreesOfFreedom} ${
    degreesOfFreedom === 1 ? 'degree' : 'degrees'
  } of freedom, ${pWords(p)}. Cars with a claim / expected were the groups alike: ${sums}.`;
}

/** A p-value with no more digits than it bears. */
function pWords(p: number): string {
  if (p < 0.001) return 'p < 0.001';
  return `p = ${formatNumber(p, p >= 0.0995 ? 1 : p >= 0.00995 ? 2 : 3)}`;
}
