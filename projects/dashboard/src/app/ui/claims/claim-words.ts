import type { ClaimRow } from '#shared/contracts/claim-list';
import type { Side, Zone } from '#shared/domain/vocabulary';
import { SIDE_NAMES, ZONE_NAMES } from '../words';

/** Where a claim leads. */
export function claimLink({ branch, claimRef }: Pick<ClaimRow, 'branch' | 'claimRef'>): string[] {
  return ['/claims', branch, claimRef];
}

/** Where on the car: "sill, outer, left"; a claim may leave the side out. */
export function claimPlace(zone: Zone, side: Side | null | undefined): string {
  return side ? `${ZONE_NAMES[zone]}, ${SIDE_NAMES[side]}` : ZONE_NAMES[zone];
}

/** Why a claim does not count (rule 14), or `undefined` where it does. The end of the warranty is told first: it stays. */
export function uncountedWords(
  claim: Pick<ClaimRow, 'counted' | 'inWarranty' | 'decision'>,
): string | undefined {
  if (claim.counted) return undefined;
  if (!claim.inWarranty) return "after the warranty's end";
  return claim.decision === 'refused' ? 'refused' : 'not by this date';
}

/** Whether a claim counts, in a word or with the reason: "counts", "does not count: refused". */
export function countedWords(claim: Pick<ClaimRow, 'counted' | 'inWarranty' | 'decision'>): string {
  const why = uncountedWords(claim);
  return why === undefined ? 'counts' : `does not count: ${why}`;
}
