import { logRank } from '#shared/stats/log-rank';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';
import { eventTimes, stepsAt } from './steps-of-times';

interface Input {
  time: number[];
  status: number[];
  group: string[];
}

describe('logRank', () => {
  it.each(checkCases<Input>('log_rank'))('given %s, agrees', (_title, check) => {
    const { time, status, group } = check.input;
    const everyone = time.map((at, index) => ({
      time: at,
      status: status[index] as number,
      group: group[index] as string,
    }));
    const times = eventTimes(everyone);
    const found = logRank(
      [...new Set(group)].map((name) =>
        stepsAt(
          times,
          everyone.filter((one) => one.group === name),
        ),
      ),
    );
    expectFigures(check, {
      observed: found?.groups.map((one) => one.observed),
      expected: found?.groups.map((one) => one.expected),
      chisq: found?.chiSquare,
      df: found?.degreesOfFreedom,
      p: found?.p,
    });
  });
});
