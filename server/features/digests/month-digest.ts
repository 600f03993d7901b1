import type { BranchCars } from '#db/queries/digests';
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
import { counted, countedFirst, countedThen, day, monthWords, percent, whole } from './in-words';

/** What head office is told of a month. */
export interface MonthFigures {
  /** `2026-01` */
  month: string;
  changes: Changes;
  /** Warranty-risk reports issued in it. */
  issued: readonly { id: number; asOf: string }[];
}

/** The mail of head office about the month that ended; nothing where no car was finished and nothing changed. */
export function monthDigest(figures: MonthFigures): Digest | undefined {
  const { month, changes, issued } = figures;
  const cars = changes.branches.reduce((sum, branch) => sum + branch.cars, 0);
  if (cars + issued.length === 0 && !hasChanges(changes)) return undefined;
  const regions = Object.keys(changes.regions).sort();
  return {
    subject: `The network in ${monthWords(month)}`,
    opening: `What the network did and what changed in ${monthWords(month)}, as it stood on ${day(changes.today)}.`,
    blocks: [
      networkBlock(figures, regions),
      ...regions
        .map((region) => ({ region, here: inRegion(changes, region) }))
        .filter(({ here }) => hasChanges(here))
        .map(({ region, here }) => regionBlock(here, region)),
    ],
  };
}

function networkBlock(
  { month, changes, issued }: MonthFigures,
  regions: readonly string[],
): DigestBlock {
  const [fresh, over, standing] = [newOf, overOf, standingOf].map((of) => of(changes).length);
  return {
    heading: 'The network',
    sentences: [
      sayCars(changes.branches, month),
      `${countedFirst(fresh ?? 0, 'signal was new', 'signals were new')}, ${countedThen(over ?? 0, 'was', 'were')} over and ${countedThen(standing ?? 0, 'stood', 'stood')} at its end.`,
      issued.length === 0
        ? 'No warranty-risk report was issued.'
        : `${countedFirst(issued.length, 'warranty-risk report was', 'warranty-risk reports were')} issued: ${issued.map(({ asOf }) => `as of ${day(asOf)}`).join(', ')}.`,
    ],
    lists: [],
    picture: pictureOf(changes, month, regions),
    caution: null,
    path: '/branches',
    pathWords: 'Compare the branches, each in its funnel',
  };
}

function regionBlock(changes: Changes, region: string): DigestBlock {
  return {
    heading: changes.regions[region] ?? region,
    sentences: sayChanges(changes),
    lists: listChanges(changes),
    picture: null,
    caution: null,
    path: `/signals?region=${encodeURIComponent(region)}`,
    pathWords: 'See these signals and the cars behind them',
  };
}

function sayCars(branches: readonly BranchCars[], month: string): string {
  const { cars, costed, kept } = sumOf(branches);
  const finished = `${countedFirst(cars, 'car was', 'cars were')} finished in ${monthWords(month)}`;
  if (kept === null) return `${finished}.`;
  return `${finished}; ${counted(costed, 'billed car', 'billed cars')} kept ${percent(kept)} of what they billed.`;
}

/** The regions by code: an order that ranks nobody. */
function pictureOf(changes: Changes, month: string, regions: readonly string[]): DigestPicture {
  const sums = regions.map((region) => ({ region, ...sumOf(inRegion(changes, region).branches) }));
  const longest = Math.max(0.01, ...sums.map(({ kept }) => kept ?? 0));
  return {
    caption: `Margin and cars of ${monthWords(month)} by region`,
    columns: ['Region', 'Margin', 'Cars', 'Signals'],
    rows: sums.map(({ region, cars, kept }) => ({
      cells: [
        changes.regions[region] ?? region,
        kept === null ? '–' : percent(kept),
        counted(cars, 'car', 'cars'),
        whole(standingOf(inRegion(changes, region)).length),
      ],
      bar: kept === null || kept <= 0 ? null : kept / longest,
    })),
  };
}

/** Cars, and the share kept by the billed ones with all their costs; none where nothing was billed. */
function sumOf(branches: readonly BranchCars[]): {
  cars: number;
  costed: number;
  kept: number | null;
} {
  const total = { cars: 0, costed: 0, revenueCents: 0, marginCents: 0 };
  for (const branch of branches) {
    for (const key of ['cars', 'costed', 'revenueCents', 'marginCents'] as const) {
      total[key] += branch[key];
    }
  }
  const { cars, costed, revenueCents, marginCents } = total;
  return { cars, costed, kept: revenueCents > 0 ? marginCents / revenueCents : null };
}
