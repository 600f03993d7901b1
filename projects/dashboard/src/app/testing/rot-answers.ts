import type {
  RotAnswer,
  RotBand,
  RotCell,
  RotModel,
  RotRegion,
  RotZone,
} from '#shared/contracts/rot';
import type { AgeBand, Side, Zone } from '#shared/domain/vocabulary';

/** Counted cars with an interval of five points to either side, or only counts below 5 cars. */
export function countedRot(cars: number, withRot: number) {
  const share = cars < 5 ? null : withRot / cars;
  return {
    cars,
    withRot,
    share,
    lower: share === null ? null : Math.max(0, share - 0.05),
    upper: share === null ? null : Math.min(1, share + 0.05),
  };
}

/** All regions together at one age. */
export function rotBand(ageBand: AgeBand, cars: number, withRot: number): RotBand {
  return { ageBand, ...countedRot(cars, withRot), referenceShare: cars < 5 ? null : 0.36 };
}

/** One age in one region. */
export function rotCell(region: string, ageBand: AgeBand, cars: number, withRot: number): RotCell {
  return { ageBand, region, ...countedRot(cars, withRot) };
}

/** A region by the sea unless said: C4, 62 µm, adjusted 33 %, 27–40 %. */
export function rotRegion(region: string, more: Partial<RotRegion> = {}): RotRegion {
  return {
    region,
    cars: 100,
    withRot: 30,
    share: 0.3,
    adjustedShare: 0.33,
    adjustedLower: 0.27,
    adjustedUpper: 0.4,
    bandsLeftOut: [],
    corrosionRateUmPerYear: 62.3,
    corrosivityCategory: 'C4',
    outsideFittedRange: false,
    ...more,
  };
}

/** A zone at one age, cars with rot by side. */
export function rotZone(
  zone: Zone,
  ageBand: AgeBand,
  cars: number,
  bySide: Partial<Record<Side, number>>,
): RotZone {
  const sides = Object.entries(bySide).map(([side, withRot]) => {
    const { cars: _, ...counted } = countedRot(cars, withRot);
    return { side: side as Side, ...counted };
  });
  const most = Math.max(...Object.values(bySide));
  return { zone, ageBand, ...countedRot(cars, most), sides };
}

/** A model at 10–14 years unless said, steadied towards 40 %. */
export function rotModel(
  model: string,
  cars: number,
  withRot: number,
  more: Partial<RotModel> = {},
): RotModel {
  const { share } = countedRot(cars, withRot);
  const shrunkShare = (8 + withRot) / (20 + cars);
  return {
    make: 'Velder',
    model,
    ageBand: '10-14',
    cars,
    withRot,
    share,
    shrunkShare,
    lower: shrunkShare - 0.1,
    upper: shrunkShare + 0.1,
    pooled: false,
    ...more,
  };
}

/** Two regions, four ages of which the last has 4 cars; 42 % of 200 cars aged 10–14, most in the outer sill on the left. */
export function rotAnswer(more: Partial<RotAnswer> = {}): RotAnswer {
  return {
    period: { from: '2025-08-04', to: '2026-02-01' },
    scope: { regions: ['IH', 'OC'], branches: ['BRE', 'HAV'] },
    jobs: 504,
    reference: 'network',
    overall: countedRot(504, 150),
    bands: [
      rotBand('5-9', 200, 30),
      rotBand('10-14', 200, 84),
      rotBand('15-19', 100, 34),
      rotBand('20+', 4, 2),
    ],
    cells: [
      rotCell('IH', '5-9', 100, 5),
      rotCell('OC', '5-9', 100, 25),
      rotCell('IH', '10-14', 100, 24),
      rotCell('OC', '10-14', 100, 60),
      rotCell('IH', '15-19', 100, 34),
      rotCell('OC', '20+', 4, 2),
    ],
    regions: [
      rotRegion('IH', {
        corrosionRateUmPerYear: 6.6,
        corrosivityCategory: 'C2',
        outsideFittedRange: true,
        bandsLeftOut: ['20+'],
      }),
      rotRegion('OC'),
    ],
    zones: [
      rotZone('sill_outer', '10-14', 200, { left: 48, right: 42 }),
      rotZone('floor', '10-14', 200, { left: 14, right: 12, centre: 2 }),
      rotZone('tailgate', '10-14', 200, { centre: 18 }),
      rotZone('sill_outer', '20+', 4, { left: 2, right: 1 }),
    ],
    models: [
      rotModel('Tessock', 58, 37),
      rotModel('Mote', 4, 1),
      rotModel('Aske', 39, 13),
      rotModel('Wren', 31, 2, { ageBand: '5-9' }),
    ],
    openedUp: { worked: 312, holed: 178, share: 0.5705, lower: 0.5148, upper: 0.6243 },
    ...more,
  };
}

/** Nothing at all in the time asked for. */
export function emptyRotAnswer(): RotAnswer {
  return rotAnswer({
    jobs: 0,
    overall: countedRot(0, 0),
    bands: [],
    cells: [],
    regions: [],
    zones: [],
    models: [],
    openedUp: { worked: 0, holed: 0, share: null, lower: null, upper: null },
  });
}
