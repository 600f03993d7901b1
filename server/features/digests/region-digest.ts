import { isoWeek } from '#shared/domain/calendar';
import {
  hasChanges,
  inRegion,
  listChanges,
  newOf,
  overOf,
  sayChanges,
  standingOf,
  type Changes,
} from './changes';
import type { Digest, DigestBlock, DigestPicture } from './digest';
import { counted, day, weekWords, whole } from './in-words';

/** The Monday mail of a regional lead: a block a region in which something changed; nothing where none did. */
export function regionDigest(changes: Changes): Digest | undefined {
  if (!hasChanges(changes)) return undefined;
  const regions = Object.keys(changes.regions).sort();
  const told = regions.filter((region) => hasChanges(inRegion(changes, region)));
  const fresh = newOf(changes).length;
  const over = overOf(changes).length;
  return {
    subject: `Your regions since ${day(changes.days.from)}: ${counted(fresh, 'new signal', 'new signals')}, ${whole(over)} over`,
    opening: `What changed in your regions from ${day(changes.days.from)} to ${day(changes.today)}.`,
    blocks: told.map((region) => blockOf(inRegion(changes, region), region)),
  };
}

function blockOf(changes: Changes, region: string): DigestBlock {
  return {
    heading: changes.regions[region] ?? region,
    sentences: sayChanges(changes),
    lists: listChanges(changes),
    picture: pictureOf(changes),
    caution: null,
    path: `/signals?region=${encodeURIComponent(region)}`,
    pathWords: 'See these signals and the cars behind them',
  };
}

/** The branches of a region by code: an order that ranks nobody. */
function pictureOf(changes: Changes): DigestPicture {
  const standing = new Map<string, number>();
  for (const { branch } of standingOf(changes)) {
    standing.set(branch, (standing.get(branch) ?? 0) + 1);
  }
  const most = Math.max(1, ...standing.values());
  return {
    caption: `Signals that stand, and cars finished in ${weekWords(isoWeek(changes.carsOf.from))}`,
    columns: ['Branch', 'Signals', 'Cars', 'Newest job'],
    rows: changes.branches.map(({ branch, branchName, cars, newestOn }) => {
      const signals = standing.get(branch) ?? 0;
      return {
        cells: [
          branchName,
          whole(signals),
          counted(cars, 'car', 'cars'),
          newestOn === null ? 'none yet' : day(newestOn),
        ],
        bar: signals === 0 ? null : signals / most,
      };
    }),
  };
}
