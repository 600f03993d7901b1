import { kaplanMeier } from '#shared/stats/kaplan-meier';
import { checkCases } from './check-values';
import { expectFigures } from './expect-figures';
import { eventTimes, stepsAt } from './steps-of-times';

interface Input {
  time: number[];
  status: number[];
}

describe('kaplanMeier', () => {
  it.each(checkCases<Input>('kaplan_meier'))('given %s, agrees', (_title, check) => {
    const { time, status } = check.input;
    const everyone = time.map((at, index) => ({ time: at, status: status[index] as number }));
    const times = eventTimes(everyone);
    const steps = stepsAt(times, everyone);
    const found = kaplanMeier(steps);
    expectFigures(check, {
      time: times,
      n_risk: steps.map((step) => step.atRisk),
      n_event: steps.map((step) => step.events),
      survival: found.map((step) => step.survival),
      se_greenwood: found.map((step) => step.standardError ?? null),
      loglog_lower: found.map((step) => step.lower ?? null),
      loglog_upper: found.map((step) => step.upper ?? null),
    });
  });
});
