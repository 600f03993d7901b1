import type { JobSheet } from '#shared/contracts/jobs';
import { isLeftDangerous } from '#shared/domain/danger';
import type { Danger } from '../../ui/caution/dangers';
import { SIDE_NAMES } from '../../ui/words';

type Finding = NonNullable<JobSheet['findings']>[number];

/** What the owner has to know before driving off, the gravest first. Common practice, no source. */
export function handedCautions(findings: readonly Finding[]): readonly Danger[] {
  const rottenPoints = findings.filter(
    (one) => one.zone === 'jacking_point' && one.action !== 'patched' && isLeftDangerous(one),
  );
  return [
    ...(findings.some(isLeftDangerous) ? [LEFT] : []),
    ...(rottenPoints.length > 0 ? [lifting(rottenPoints)] : []),
    ...(findings.some((one) => one.structural && one.action === 'patched') ? [REPAIRED] : []),
    FRESH_WAX,
    BRAKES,
  ];
}

const LEFT: Danger = {
  danger: 'Not repaired, load-bearing',
  words:
    'The places marked with a triangle carry load and are rusted. The car may not be fit for the road: have them inspected and repaired by a competent and, where required, licensed person before it is relied on. The local inspection rules decide.',
};
const REPAIRED: Danger = {
  danger: 'Load-bearing repair',
  words:
    'Whether the repair of a load-bearing place is enough is decided by the local inspection rules; have it inspected where they ask for it.',
};
const FRESH_WAX: Danger = {
  danger: 'Fresh wax burns',
  words:
    'It smells and may drip for some days: air the car, and keep flames, sparks, welding and great heat away until it is dry. Tell any workshop that is to weld on this car.',
};
const BRAKES: Danger = {
  danger: 'Brakes',
  words:
    'Work was done around them. Try them before driving off and gently on the first metres. If something seems off, stop, do not drive on, and call the workshop.',
};

function lifting(points: readonly Finding[]): Danger {
  const sides = [...new Set(points.map(({ side }) => SIDE_NAMES[side]))].join(' and ');
  return {
    danger: 'Lifting',
    words: `Do not jack or lift the car at its jacking points, ${sides}: they are rusted.`,
  };
}
