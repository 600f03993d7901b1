import { chiSquareUpperTail } from '#shared/stats/chi-square';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

describe('chiSquareUpperTail', () => {
  it.each(checkCases<{ x: number[]; df: number[] }>('chi_square'))(
    'given %s, agrees',
    (_title, check) => {
      const { x, df } = check.input;
      expectFigures(check, {
        upper_tail: x.map((value, index) => chiSquareUpperTail(value, df[index] as number)),
      });
    },
  );
});
