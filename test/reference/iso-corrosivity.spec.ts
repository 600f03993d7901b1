import { corrosionRate, corrosivityCategory } from '#shared/stats/iso-corrosivity';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

type Input = { T: number; RH: number; Pd: number; Sd: number } | { r: number[] };

describe('corrosionRate', () => {
  it.each(checkCases<Input>('iso_corrosivity'))('given %s, agrees', (_title, check) => {
    if ('r' in check.input) {
      expectFigures(check, {
        category: check.input.r.map((rate) => corrosivityCategory(rate) ?? '>CX'),
      });
      return;
    }
    const { T, RH, Pd, Sd } = check.input;
    const found = corrosionRate({
      temperatureC: T,
      humidityPct: RH,
      so2Deposition: Pd,
      chlorideDeposition: Sd,
    });
    expectFigures(check, { rcorr_um_per_a: found.umPerYear, category: found.category ?? '>CX' });
  });
});
