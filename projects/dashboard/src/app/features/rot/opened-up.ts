import type { OpenedUp } from '#shared/contracts/rot';
import { formatCount, formatCounted, formatShare } from '../../ui/format';
import { rangeText } from './rot-words';

/** How often a bubble turned out to be a hole: "Of 312 bubbles worked, 178 opened into holes: 57 % (51–62 %)." */
export function openedUpSentence(opened: OpenedUp): string {
  const { worked, holed, share } = opened;
  if (worked === 0) return 'No bubble was worked on in this time.';
  const what = `Of ${formatCounted(worked, 'bubble', 'bubbles')} worked, ${formatCount(holed)} opened into ${holed === 1 ? 'a hole' : 'holes'}`;
  return share === null
    ? `${what}: too few for a share, which is shown from 5 on.`
    : `${what}: ${formatShare(share)} (${rangeText(opened)}).`;
}
