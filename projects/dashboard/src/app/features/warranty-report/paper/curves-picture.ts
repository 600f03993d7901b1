import type { WarrantyAnswer } from '#shared/contracts/warranty';
import type { ClaimFreeInput } from '../../../charts/claim-free-curves/claim-free-input';
import { shareAxis } from '../../../charts/claim-free-curves/share-axis';
import { formatCount, formatNumber, formatShare } from '../../../ui/format';
import { groupWords } from '../report-words';

/** Curves of the groups of the report, with where their axis starts in words; nothing where there is no group. */
export function curvesPicture({
  groups,
}: WarrantyAnswer): { readonly chart: ClaimFreeInput; readonly axis: string } | undefined {
  if (groups.length === 0) return undefined;
  const curves = groups.map(({ key, cars, months }) => ({
    key,
    label: groupWords(key),
    cars,
    months,
  }));
  const { low, decimals } = shareAxis(curves);
  return {
    axis: `Axis starts at ${formatNumber(low * 100, decimals)}.`,
    chart: {
      curves,
      shareText,
      countText: formatCount,
      summary: curves.map(({ label, months }) => `${label}: ${endWords(months)}`).join('; '),
    },
  };
}

function endWords(months: ClaimFreeInput['curves'][number]['months']): string {
  const last = months.filter(({ share }) => share !== null).at(-1);
  if (!last || last.share === null) return 'too few cars';
  return `${shareText(last.share)} without a claim after ${formatCount(last.month)} months`;
}

/** Whole per cent, or a tenth where the whole would hide that there were claims. */
function shareText(share: number): string {
  return formatShare(share, share > 0.99 && share < 1 ? 1 : 0);
}
