import type { MinuteLists } from '#db/queries/overrun';
import type { OverrunGroup } from '#shared/contracts/overrun';
import { FEWEST_CARS } from '#shared/domain/small-samples';
import { ascending, quantile } from '#shared/stats/quantile';
import { ratioEstimate } from '#shared/stats/ratio-estimate';

/**
 * The overrun of some estimated cars. The ratio is of sums over all of them, its error the ratio estimator's (rule 26);
 * quantiles are of the ratios of the cars whose own estimate is above 0, which leaves none out but by stage (rule 28).
 */
export function overrunFigures({ estimated, actual }: MinuteLists): Omit<OverrunGroup, 'key'> {
  const cars = estimated.length;
  const estimate = cars >= FEWEST_CARS ? ratioEstimate(actual, estimated) : undefined;
  const ratios = ratiosOf(estimated, actual);
  const shown = ratios.length >= FEWEST_CARS ? ascending(ratios) : [];
  const p80 = quantile(shown, 0.8);
  return {
    cars,
    estimatedMinutes: sum(estimated),
    actualMinutes: sum(actual),
    ratio: estimate?.ratio ?? null,
    ratioStandardError: estimate?.standardError ?? null,
    median: quantile(shown, 0.5) ?? null,
    p80: p80 ?? null,
    p95: quantile(shown, 0.95) ?? null,
    allowance: p80 === undefined ? null : p80 - 1,
  };
}

function ratiosOf(estimated: Float64Array, actual: Float64Array): Float64Array {
  const ratios = new Float64Array(estimated.length);
  let count = 0;
  for (let index = 0; index < estimated.length; index += 1) {
    const planned = estimated[index] as number;
    if (planned > 0) ratios[count++] = (actual[index] as number) / planned;
  }
  return ratios.subarray(0, count);
}

/** Whole minutes: exact without compensation. */
function sum(minutes: Float64Array): number {
  let all = 0;
  for (const value of minutes) all += value;
  return all;
}
