import type { OverrunGrouping } from '#shared/contracts/overrun';
import { BODY_TYPES, STAGES } from '#shared/domain/vocabulary';
import { formatMonth, formatNumber, formatShareRange, formatSignedShare } from '../../ui/format';
import { BODY_TYPE_NAMES, STAGE_NAMES } from '../../ui/words';

/** Two-sided 95 % of the standard normal (rule 26). */
export const Z95 = 1.959964;

/** What the page needs to turn codes into words. */
export interface OverrunWords {
  readonly branchName: (code: string) => string;
  readonly regionName: (code: string) => string;
  readonly packageName: (code: string) => string;
}

/** Groupings offered below the stages, in reading order. */
export const GROUPINGS = [
  'ageBand',
  'rotFound',
  'package',
  'bodyType',
  'month',
  'branch',
  'region',
] as const satisfies readonly OverrunGrouping[];
export type Grouping = (typeof GROUPINGS)[number];

/** A grouping as the button that chooses it. */
export const GROUPING_LABELS: Readonly<Record<Grouping, string>> = {
  ageBand: 'Age',
  rotFound: 'Rot',
  package: 'Package',
  bodyType: 'Body type',
  month: 'Month',
  branch: 'Branch',
  region: 'Region',
};

/** A grouping over the column of its groups. */
export const GROUPING_COLUMN: Readonly<Record<OverrunGrouping, string>> = {
  stage: 'Stage',
  ageBand: 'Age',
  rotFound: 'Rot',
  package: 'Package',
  bodyType: 'Body type',
  month: 'Month',
  branch: 'Branch',
  region: 'Region',
};

/** A grouping inside a title: "By age of the car". */
export const GROUPING_TITLES: Readonly<Record<Grouping, string>> = {
  ageBand: 'By age of the car',
  rotFound: 'By whether rot was found',
  package: 'By package',
  bodyType: 'By body type',
  month: 'By month',
  branch: 'By branch',
  region: 'By region',
};

/** A group's key as people say it. */
export function groupName(by: OverrunGrouping, key: string, words: OverrunWords): string {
  switch (by) {
    case 'stage':
      return STAGE_NAMES[STAGES.find((stage) => stage === key) ?? 'strip'];
    case 'branch':
      return words.branchName(key);
    case 'region':
      return words.regionName(key);
    case 'package':
      return words.packageName(key).toLocaleLowerCase('en');
    case 'bodyType':
      return BODY_TYPE_NAMES[BODY_TYPES.find((type) => type === key) ?? 'hatchback'];
    case 'month':
      return formatMonth(key);
    case 'ageBand':
      return key.includes('-')
        ? `${key.replace('-', '–')} years`
        : `${key.replace('+', '')} years and over`;
    case 'rotFound':
      return key === 'found' ? 'rot found' : 'no rot found';
  }
}

/** From here on an overrun is read as a multiple. */
const MANY_TIMES = 3;

/** A ratio of worked to estimated time as the part that was added: 1.23 → "+23 %"; from three times on as such: "11.8 times". */
export function ratioText(ratio: number): string {
  return ratio >= MANY_TIMES ? `${formatNumber(ratio, 1)} times` : formatSignedShare(ratio - 1);
}

/** The 95 % interval of a ratio, read as the ratio itself: "19–27 %", "−2 to 5 %", "8.7–14.9 times". */
export function intervalText(ratio: number, standardError: number): string {
  const reach = Z95 * standardError;
  if (ratio >= MANY_TIMES) {
    return `${formatNumber(Math.max(0, ratio - reach), 1)}–${formatNumber(ratio + reach, 1)} times`;
  }
  return formatShareRange(ratio - reach - 1, ratio + reach - 1);
}

/** Why a group has no figure: for a stage that no estimate names, not its number of cars. */
export function noFigureText(estimatedMinutes: number, cars: number): string {
  return estimatedMinutes === 0 && cars >= 5 ? 'never estimated' : 'too few cars yet';
}
