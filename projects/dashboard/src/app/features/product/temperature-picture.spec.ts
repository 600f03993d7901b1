import { productTemperature } from '../../testing/product-answers';
import type { ProductWords } from './product-words';
import { temperaturePicture } from './temperature-picture';

const words: ProductWords = {
  currency: 'EUR',
  branchName: (code) => code,
  packageWord: (code) => code,
  productName: (code) => code,
  isWax: (code) => code === 'CW1',
};
const say = (more: Parameters<typeof productTemperature>[0] = {}, product = 'CW1') =>
  temperaturePicture(product, productTemperature(more), words).finding;

describe('temperaturePicture', () => {
  it('less when warm: by how much, give or take, from how many cars, and why', () => {
    expect(say()).toBe(
      '41 ml less for every degree warmer (give or take 6, 380 cars): cold wax is thick and does not run, so more goes in.',
    );
  });

  it('not a wax, or more when warm: the change without that reason', () => {
    expect(say({ product: 'SC1' }, 'SC1')).toBe(
      '41 ml less for every degree warmer (give or take 6, 380 cars).',
    );
    expect(say({ slopeMlPerDegree: 12, lower: 10, upper: 14 })).toBe(
      '12 ml more for every degree warmer (give or take 2, 380 cars).',
    );
  });

  it('an interval about 0: no clear change', () => {
    expect(say({ slopeMlPerDegree: -0.4, lower: -1.9, upper: 1.1 })).toBe(
      'No clear change with temperature (−0.4 ml a degree, give or take 1.5, 380 cars).',
    );
  });

  it('a slope without its interval: what it is, and no more', () => {
    expect(say({ lower: null, upper: null })).toBe(
      'About 41 ml less for every degree warmer (380 cars).',
    );
  });

  it('few cars, one temperature, none: why nothing is said', () => {
    const none = { slopeMlPerDegree: null, lower: null, upper: null };
    expect(say({ ...none, cars: 4 })).toBe('Too few cars yet: 4 cars with a temperature.');
    expect(say({ ...none, cars: 40 })).toContain('Nothing can be said yet');
    const absent = temperaturePicture('CW1', undefined, words);
    expect(absent.finding).toContain('No car with this product');
    expect(absent.chart).toBeNull();
  });

  it('classes: each 5 degrees wide, too few cars without quartiles, all in the text alternative', () => {
    const { chart, columns, rows } = temperaturePicture('CW1', productTemperature(), words);
    expect(chart!.classes.map(({ fromC, toC }) => [fromC, toC])[1]).toEqual([10, 15]);
    expect(chart!.classes[0]!.quartiles).toBeNull();
    expect(chart!.summary).toContain('4,050 ml or more at 10–15 °C (140 cars)');
    expect(columns[0]!.text({ ...rows[0]!, fromC: -5 })).toBe('−5 to 0');
  });
});
