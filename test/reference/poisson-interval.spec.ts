import { poissonInterval } from '#shared/stats/poisson-interval';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';

interface Count {
  count: number;
  exposure: number;
  level: number;
}

/** Observed against expected, the expected count given or to be made of standard rates. */
type Against =
  | { observed: number; expected: number }
  | {
      events: number[];
      person_time: number[];
      standard_events: number[];
      standard_person_time: number[];
    };

describe('poissonInterval', () => {
  it.each(checkCases<Count>('poisson_exact'))('given %s, agrees', (_title, check) => {
    const { count, exposure, level } = check.input;
    const { lower, upper } = poissonInterval(count, level);
    expectFigures(check, {
      rate: count / exposure,
      lower: lower / exposure,
      upper: upper / exposure,
    });
  });

  it.each(checkCases<Against>('observed_expected'))(
    'given observed against expected in %s, agrees',
    (_title, check) => {
      const { observed, expected } = countsOf(check.input);
      const { lower, upper } = poissonInterval(observed);
      expectFigures(check, {
        observed,
        expected,
        smr: observed / expected,
        lower: lower / expected,
        upper: upper / expected,
      });
    },
  );
});

function countsOf(input: Against): { observed: number; expected: number } {
  if ('observed' in input) return input;
  const { events, person_time: exposures, standard_events: standard } = input;
  return {
    observed: events.reduce((sum, count) => sum + count, 0),
    expected: exposures.reduce((sum, exposure, band) => {
      const rate = (standard[band] as number) / (input.standard_person_time[band] as number);
      return sum + exposure * rate;
    }, 0),
  };
}
