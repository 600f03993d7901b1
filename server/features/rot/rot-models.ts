import type { Spelling } from '#db/queries/rot';
import type { RotModel } from '#shared/contracts/rot';
import { shareOf } from '#shared/domain/small-samples';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import { fitBetaBinomial, shrunkShare } from '#shared/stats/beta-binomial';
import { wilsonInterval } from '#shared/stats/wilson-interval';
import { sumOf, type ModelTally } from './tally-cars';

/**
 * Every model and age band with a car, by make, model and band, as the newest car of a model spells it (rule 33). The share
 * of each is steadied toward all models of its band (rule 34).
 */
export function rotModels(
  byModel: ReadonlyMap<string, ModelTally>,
  spellings: ReadonlyMap<number, Spelling>,
): RotModel[] {
  const tallies = [...byModel.values()]
    .map((tally) => ({ ...tally, spelling: spellingOf(tally, spellings) }))
    .sort(
      (a, b) =>
        compare(a.spelling.make, b.spelling.make) || compare(a.spelling.model, b.spelling.model),
    );
  const steadied = AGE_BANDS.map((_, band) => steadyBand(tallies, band));
  return tallies.flatMap(({ spelling, cars, withRot }) =>
    AGE_BANDS.flatMap((ageBand, band): RotModel[] => {
      const [all, rotten] = [cars[band] as number, withRot[band] as number];
      if (all === 0) return [];
      const counted = { cars: all, withRot: rotten, share: shareOf(rotten, all).share };
      return [{ ...spelling, ageBand, ...counted, ...steadied[band]!(rotten, all) }];
    }),
  );
}

type Steadied = Pick<RotModel, 'shrunkShare' | 'lower' | 'upper' | 'pooled'>;

/** How the share of a model of this band is steadied; where the models differ no more than chance, all get the share of all. */
function steadyBand(
  models: readonly ModelTally[],
  band: number,
): (withRot: number, cars: number) => Steadied {
  const withRot = models.map((model) => model.withRot[band] as number);
  const cars = models.map((model) => model.cars[band] as number);
  const fit = fitBetaBinomial(withRot, cars);
  if (fit) {
    return (y, n) => {
      const { share, lower, upper } = shrunkShare(fit, y, n);
      return { shrunkShare: share, lower, upper, pooled: false };
    };
  }
  const all = wilsonInterval(sumOf(withRot), sumOf(cars));
  return () => ({
    shrunkShare: all?.estimate ?? 0,
    lower: all?.lower ?? 0,
    upper: all?.upper ?? 1,
    pooled: true,
  });
}

function spellingOf({ newest }: ModelTally, spellings: ReadonlyMap<number, Spelling>): Spelling {
  const found = spellings.get(newest.jobId);
  if (!found) throw new Error('a job that was counted has no spelling');
  return found;
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
