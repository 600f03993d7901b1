import { tabularCusum } from '#shared/stats/cusum';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

interface Charted {
  values: number[];
  target: number;
  k: number;
  h: number;
}

describe('tabularCusum', () => {
  it.each(checkCases<Charted>('cusum_tabular'))('given %s, agrees', (_title, check) => {
    const { values, ...plan } = check.input;
    const { high, low, signals } = tabularCusum(values, plan);
    // The handbook counts its points from 1.
    expectFigures(check, { high, low, signals: signals.map((point) => point + 1) });
  });
});
