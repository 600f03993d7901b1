import { isDangerous } from '#shared/domain/danger';
import type { JobSheet } from '#shared/contracts/jobs';
import type { Zone } from '#shared/domain/vocabulary';
import type { TypedClaim } from '../../core/drafts/claim-draft';
import { type Danger, FIRE, ROTTEN_POINT } from '../../ui/caution/dangers';

type Finding = NonNullable<JobSheet['findings']>[number];

/** Zones that bear load in most cars. Common practice, no source; the car at hand and local codes decide. */
const LOAD_BEARING: readonly Zone[] = [
  'sill_outer',
  'sill_inner',
  'floor',
  'jacking_point',
  'chassis_rail',
  'front_subframe',
  'rear_subframe',
];

const MAY_NOT_BE_FIT: Danger = {
  danger: 'Rot that bears load',
  words:
    'If rot is back where the car bears load, it may not be fit for the road. Tell the owner in writing before it is driven away; local inspection rules and a competent person decide.',
};
const POINT: Danger = {
  danger: ROTTEN_POINT.danger,
  words:
    'This jacking point may be rotten. Do not support the car on it: use other rated, sound points, and check the stands before going under.',
};

/** What to beware of where rust came back. Work beside fuel, lines and wax is warned of as soon as it takes time. */
export function claimCautions(
  { zone, side, labourMinutes }: TypedClaim,
  findings: readonly Finding[],
): readonly Danger[] {
  const place = zone as Zone;
  const seenBefore = findings.some(
    (one) => one.zone === zone && (side === '' || one.side === side) && isDangerous(one),
  );
  const bears = LOAD_BEARING.includes(place) || seenBefore;
  return [
    ...(bears ? [MAY_NOT_BE_FIT] : []),
    ...(place === 'jacking_point' ? [POINT] : []),
    ...(zone !== '' && Number(labourMinutes) > 0 ? [FIRE] : []),
  ];
}
