import type { OverrunGroup } from '#shared/contracts/overrun';
import { ascending, quantile } from '#shared/stats/quantile';
import { ratioEstimate } from '#shared/stats/ratio-estimate';

/** Cars below which no ratio, quantile or allowance is shown (rule 13). */
const FEWEST = 5;

/** Estimated and actual minutes of the cars of one group, gathered one by one. */
export class MinutePairs {
  private readonly estimated: number[] = [];
  private readonly actual: number[] = [];

  add(estimated: number, actual: number): void {
    this.estimated.push(estimated);
    this.actual.push(actual);
  }

  /** The figures of the group; quantiles are over the cars whose estimate is above 0 (rule 28). */
  figures(): Omit<OverrunGroup, 'key'> {
    const cars = this.estimated.length;
    const estimate = cars >= FEWEST ? ratioEstimate(this.actual, this.estimated) : undefined;
    const ratios = this.ratios();
    const shown = ratios.length >= FEWEST ? ratios : [];
    const p80 = quantile(shown, 0.8);
    return {
      cars,
      estimatedMinutes: sum(this.estimated),
      actualMinutes: sum(this.actual),
      ratio: estimate?.ratio ?? null,
      ratioStandardError: estimate?.standardError ?? null,
      median: quantile(shown, 0.5) ?? null,
      p80: p80 ?? null,
      p95: quantile(shown, 0.95) ?? null,
      allowance: p80 === undefined ? null : p80 - 1,
    };
  }

  private ratios(): Float64Array {
    const ratios: number[] = [];
    this.estimated.forEach((estimated, index) => {
      if (estimated > 0) ratios.push((this.actual[index] ?? 0) / estimated);
    });
    return ascending(ratios);
  }
}

function sum(minutes: readonly number[]): number {
  let all = 0;
  for (const value of minutes) all += value;
  return all;
}
