import { corrosionRate } from './iso-corrosivity';

const mild = { temperatureC: 9, humidityPct: 76, so2Deposition: 4, chlorideDeposition: 3 };

describe('corrosionRate', () => {
  it('given air within the fitted range, says so', () => {
    expect(corrosionRate(mild).outsideFittedRange).toBe(false);
  });

  it.each([
    { temperatureC: 28.8 },
    { temperatureC: -17.2 },
    { humidityPct: 33 },
    { humidityPct: 94 },
    { so2Deposition: 0.6 },
    { so2Deposition: 151 },
    { chlorideDeposition: 0 },
    { chlorideDeposition: 761 },
  ])('given %j outside the fitted range, still gives a rate and says so', (change) => {
    const found = corrosionRate({ ...mild, ...change });
    expect(found.outsideFittedRange).toBe(true);
    expect(found.umPerYear).toBeGreaterThan(0);
  });

  it('given more than 700 µm a year, has no category', () => {
    const found = corrosionRate({
      ...mild,
      temperatureC: 28,
      humidityPct: 93,
      chlorideDeposition: 5000,
    });
    expect(found.umPerYear).toBeGreaterThan(700);
    expect(found.category).toBeNull();
  });

  it.each([
    { temperatureC: Number.NaN },
    { humidityPct: 101 },
    { humidityPct: -1 },
    { so2Deposition: -1 },
    { chlorideDeposition: Infinity },
  ])('given %j, throws', (change) => {
    expect(() => corrosionRate({ ...mild, ...change })).toThrow(RangeError);
  });
});
