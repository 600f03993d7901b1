import type { RotAnswer, RotCell, RotRegion } from '#shared/contracts/rot';
import { AGE_BANDS, type AgeBand } from '#shared/domain/vocabulary';
import type {
  AgeRegionCell,
  AgeRegionInput,
  RegionPanel,
} from '../../charts/age-region/age-region-input';
import {
  formatCount,
  formatList,
  formatNumber,
  formatShare,
  formatShareRange,
} from '../../ui/format';
import { bandOf } from './age-choice';
import { ageLabel, agedWords, type RotWords, shareOfCars, shareText } from './rot-words';

/** The picture by age and region: regions by their air, ages as rows, those without a car anywhere left out. */
export function regionPicture(answer: RotAnswer, age: AgeBand, words: RotWords): AgeRegionInput {
  const ages = agesOf(answer);
  return {
    summary: summarise(answer, age, words),
    rows: ages.map((band) => ({ key: band, label: ageLabel(band), chosen: band === age })),
    panels: regionsWithCars(answer).map((region) => panelOf(answer, region, ages, words)),
    references: ages.map((band) => bandOf(answer, band).referenceShare),
    referenceWord: answer.reference === 'network' ? 'network' : 'all branches you see',
  };
}

/** The quiet line of method, and what the reference is. */
export function regionNote({ reference }: RotAnswer): string {
  return reference === 'network'
    ? 'Adjusted: each region as if its cars had the network’s ages'
    : 'Adjusted: each region as if its cars had the ages of all the branches you see, too few other branches being behind a figure of the network';
}

/**
 * Regions that have a car of any age, the harshest air first, so that rot and air are read together; the others would be empty
 * frames.
 */
export function regionsWithCars({ regions }: Pick<RotAnswer, 'regions'>): readonly RotRegion[] {
  return regions
    .filter(({ cars }) => cars > 0)
    .sort((a, b) => (b.corrosionRateUmPerYear ?? -1) - (a.corrosionRateUmPerYear ?? -1));
}

/** What the air of a region does to bare steel: "air C4, 62 µm a year". */
export function airWords(region: RotRegion): string {
  const { corrosionRateUmPerYear: rate, corrosivityCategory: category } = region;
  if (rate === null) return 'no climate known';
  const speed = `${formatNumber(rate, rate < 10 ? 1 : 0)}\u00a0µm a\u00a0year`;
  const kind = category === null ? 'air beyond CX' : `air\u00a0${category}`;
  const outside = region.outsideFittedRange ? ', outside the fitted range' : '';
  return `${kind}, ${speed}${outside}`;
}

/** Ages of which there is a car. */
export function agesOf({ bands }: Pick<RotAnswer, 'bands'>): readonly AgeBand[] {
  return AGE_BANDS.filter((age) => bands.some(({ ageBand, cars }) => ageBand === age && cars > 0));
}

function panelOf(
  answer: RotAnswer,
  region: RotRegion,
  ages: readonly AgeBand[],
  { regionName }: RotWords,
): RegionPanel {
  const { adjustedShare, adjustedLower, adjustedUpper, bandsLeftOut } = region;
  return {
    key: region.region,
    name: regionName(region.region),
    air: airWords(region),
    cells: ages.map((age) =>
      drawnCell(answer.cells.find((cell) => cell.region === region.region && cell.ageBand === age)),
    ),
    adjusted: adjustedShare === null ? 'too few cars' : formatShare(adjustedShare),
    adjustedRange:
      adjustedLower === null || adjustedUpper === null
        ? ''
        : `(${formatShareRange(adjustedLower, adjustedUpper)})`,
    adjustedNote:
      adjustedShare === null || bandsLeftOut.length === 0
        ? ''
        : `without ${formatList(bandsLeftOut.map(ageLabel))}`,
  };
}

function drawnCell(cell: RotCell | undefined): AgeRegionCell {
  const { cars, share, lower, upper } = cell ?? { cars: 0, share: null, lower: null, upper: null };
  return { cars, count: formatCount(cars), share, lower, upper };
}

function summarise(answer: RotAnswer, age: AgeBand, { regionName }: RotWords): string {
  const said = regionsWithCars(answer).map((region) => {
    const name = regionName(region.region);
    const cell = answer.cells.find((one) => one.region === region.region && one.ageBand === age);
    const counted = cell ? shareOfCars(cell) : 'no car';
    const adjusted =
      region.adjustedShare === null
        ? ''
        : `, adjusted for age over all ages ${shareText({ share: region.adjustedShare })}`;
    return `${name} ${counted}${adjusted}`;
  });
  return `Cars aged ${agedWords(age)} with rot: ${said.join('; ')}.`;
}
