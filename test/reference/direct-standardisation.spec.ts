import { directlyStandardised } from '#shared/stats/direct-standardisation';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

interface Bands {
  events: number[];
  person_time: number[];
  standard: number[];
  level: number;
}

describe('directlyStandardised', () => {
  it.each(checkCases<Bands>('direct_standardisation'))('given %s, agrees', (_title, check) => {
    const { events, person_time: sizes, standard, level } = check.input;
    expectFigures(check, { ...directlyStandardised(events, sizes, standard, level) });
  });
});
