import { costPerCar, useFigures } from './use-figures';
import { normRatio } from './norm-ratio';
import { useByTemperature } from './use-by-temperature';

const use = (over: Partial<Parameters<typeof useFigures>[0]>) =>
  useFigures({ cars: 0, ml: [], normMl: null, costCents: 0, costedLines: 0, ...over });

describe('useFigures', () => {
  it('given a norm, counts cars that list nothing as 0 ml at no cost (rule 37)', () => {
    // Six cars against 1000 ml: 0, 0, 700, 1000, 1300, 1400.
    const ml = [1400, 700, 1000, 1300];
    const figures = use({ cars: 6, ml, normMl: 1000, costCents: 4401, costedLines: 4 });
    expect(figures).toMatchObject({
      cars: 6,
      carsListing: 4,
      medianMl: 850,
      p25Ml: 175,
      // 4401 / 6 = 733.5, rounded half up (rule 38).
      costPerCarCents: 734,
      under: 2,
      over: 1,
      underShare: 2 / 6,
      overShare: 1 / 6,
    });
    expect(figures.meanMl).toBeCloseTo(4400 / 6, 12);
    expect(figures.p90Ml).toBeCloseTo(1350, 12);
  });

  it('given exactly 70 % and 130 % of a norm, counts neither under nor over', () => {
    const ml = [7, 13, 10, 6, 14];
    expect(use({ cars: 5, ml, normMl: 10 })).toMatchObject({ under: 1, over: 1 });
    // 0.7 × 12345.0 is not a whole number of millilitres; 8641 lies under 8641.5, 8642 does not.
    const edge = [8641, 8642, 16_048, 16_049, 12_345];
    expect(use({ cars: 5, ml: edge, normMl: 12_345 })).toMatchObject({ under: 1, over: 1 });
  });

  it('given no norm, tells neither under nor over, and 0 ml listed is a car but not one it went into', () => {
    const figures = use({ cars: 5, ml: [0, 10, 20, 30, 40], costedLines: 5, costCents: 7 });
    expect(figures).toMatchObject({ cars: 5, carsListing: 4, meanMl: 20, costPerCarCents: 1 });
    expect([figures.under, figures.over, figures.underShare]).toEqual([null, null, null]);
  });

  it('given four cars, keeps counts and nothing else (rule 13)', () => {
    expect(use({ cars: 4, ml: [1, 2, 3, 4], normMl: 10, costCents: 9, costedLines: 4 })).toEqual({
      ...{ cars: 4, carsListing: 4, meanMl: null, p10Ml: null, p25Ml: null, medianMl: null },
      ...{ p75Ml: null, p90Ml: null, normMl: 10, costPerCarCents: null, under: 4, over: 0 },
      ...{ underShare: null, overShare: null },
    });
  });

  it('given costs that were not known, leaves those cars out of the cost', () => {
    const ml = [10, 10, 10];
    // Eight cars, one line unknown: 70 cents over seven.
    expect(use({ cars: 8, ml, normMl: 10, costCents: 70, costedLines: 2 }).costPerCarCents).toBe(
      10,
    );
    expect(costPerCar(70, 4)).toBeNull();
  });
});

describe('normRatio', () => {
  it('given five cars, tells the ratio of sums with its interval; given four, the count', () => {
    const foreseen = [100, 100, 100, 100, 100];
    const ratio = normRatio({ used: [80, 100, 120, 140, 160], foreseen });
    // s.e. = sqrt(Σ(a − 120)² / (5·4)) / 100 = sqrt(4000/20)/100.
    expect(ratio.ratioToNorm).toBeCloseTo(1.2, 12);
    expect(ratio.upper).toBeCloseTo(1.2 + 1.959964 * Math.sqrt(200) * 0.01, 9);
    expect(normRatio({ used: [1, 1, 1, 1], foreseen: [1, 1, 1, 1] })).toEqual({
      ...{ cars: 4, ratioToNorm: null, lower: null, upper: null },
    });
  });
});

describe('useByTemperature', () => {
  it('given warmer workshops, tells the slope and the classes from the cars with a temperature that list it', () => {
    const told = useByTemperature('CW1', [
      { ml: [100, 90, 80, 0], temperatures: [0, 5, 10, 12] },
      { ml: [70, 60, 50], temperatures: [15, 20, null] },
    ]);
    expect(told).toMatchObject({ product: 'CW1', cars: 5, slopeMlPerDegree: -2 });
    // Five cars make ten pairs, too few for limits; six make enough, and all of theirs are the same.
    expect([told.lower, told.upper]).toEqual([null, null]);
    const six = { ml: [100, 90, 80, 70, 60, 50], temperatures: [0, 5, 10, 15, 20, 25] };
    expect(useByTemperature('CW1', [six])).toMatchObject({ lower: -2, upper: -2 });
    expect(told.classes.map(({ fromC, cars }) => [fromC, cars])).toEqual([
      ...[
        [0, 1],
        [5, 1],
        [10, 1],
        [15, 1],
        [20, 1],
      ],
    ]);
    expect(told.classes[0]).toMatchObject({ p25Ml: null, medianMl: null, p75Ml: null });
  });

  it('given degrees below 0, puts them into the class that begins below them', () => {
    const degrees = [-0.5, -1, -4, -5, -2];
    const { classes, slopeMlPerDegree } = useByTemperature('CW1', [
      { ml: [1, 2, 3, 4, 5], temperatures: degrees },
    ]);
    expect(classes).toEqual([{ fromC: -5, cars: 5, p25Ml: 2, medianMl: 3, p75Ml: 4 }]);
    expect(slopeMlPerDegree).not.toBeNull();
  });

  it('given four cars, or one temperature for all, tells no slope', () => {
    const four = useByTemperature('CW1', [{ ml: [1, 2, 3, 4], temperatures: [1, 2, 3, 4] }]);
    expect(four.slopeMlPerDegree).toBeNull();
    const level = useByTemperature('CW1', [{ ml: [1, 2, 3, 4, 5], temperatures: [1, 1, 1, 1, 1] }]);
    expect(level.slopeMlPerDegree).toBeNull();
  });
});
