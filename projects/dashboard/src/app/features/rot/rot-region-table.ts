import type { RotAnswer } from '#shared/contracts/rot';
import type { AgeBand } from '#shared/domain/vocabulary';
import type { CellLink, Column } from '../../ui/data-table/column';
import { formatCount, formatShare } from '../../ui/format';
import { bandOf } from './age-choice';
import { regionsWithCars } from './rot-regions';
import { ageLabel, rangeText, type RotWords, shareText } from './rot-words';

/** A row of the table by age and region: one age, or all ages adjusted. */
export interface RegionRow {
  readonly region: string;
  /** Null: all ages, adjusted. */
  readonly age: AgeBand | null;
  readonly cars: number;
  readonly withRot: number;
  readonly share: number | null;
  readonly lower: number | null;
  readonly upper: number | null;
  readonly reference: number | null;
}

/** Leads to the cars with rot behind a row. */
export type RegionLink = (row: RegionRow) => CellLink | undefined;

/** The figures of the picture by age and region as rows, each region followed by its adjusted share. */
export function regionRows(answer: RotAnswer): readonly RegionRow[] {
  return regionsWithCars(answer).flatMap((region) => [
    ...answer.cells
      .filter((cell) => cell.region === region.region)
      .map(({ ageBand, ...cell }): RegionRow => ({
        ...cell,
        age: ageBand,
        reference: bandOf(answer, ageBand).referenceShare,
      })),
    {
      region: region.region,
      age: null,
      cars: region.cars,
      withRot: region.withRot,
      share: region.adjustedShare,
      lower: region.adjustedLower,
      upper: region.adjustedUpper,
      reference: null,
    },
  ]);
}

/** Columns of that table. */
export function regionColumns(
  { reference }: Pick<RotAnswer, 'reference'>,
  { regionName }: RotWords,
  link: RegionLink,
): readonly Column<RegionRow>[] {
  const strong = ({ age }: RegionRow): boolean => age === null;
  return [
    { key: 'region', label: 'Region', strong, text: ({ region }) => regionName(region) },
    {
      key: 'age',
      label: 'Age',
      strong,
      text: ({ age }) => (age === null ? 'all, adjusted' : ageLabel(age)),
      link,
    },
    { key: 'cars', label: 'Cars', kind: 'number', text: ({ cars }) => formatCount(cars) },
    { key: 'rot', label: 'Rot', kind: 'number', text: ({ withRot }) => formatCount(withRot) },
    {
      key: 'share',
      label: 'Share',
      kind: 'number',
      strong: ({ share }) => share !== null,
      muted: ({ share }) => share === null,
      text: shareText,
    },
    { key: 'range', label: '95\u202f%', kind: 'number', text: rangeText },
    {
      key: 'reference',
      label: reference === 'network' ? 'Network' : 'All you see',
      kind: 'number',
      text: ({ reference: share }) => (share === null ? '' : formatShare(share)),
    },
  ];
}
