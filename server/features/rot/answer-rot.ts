import type { NetworkReference } from '#db/network-reference';
import type { JobFilters } from '#db/queries/job-filters';
import { readClimates, readRotCars, readSpellings } from '#db/queries/rot';
import type { ScopedDb } from '#db/scoped-db';
import type { RotAnswer, RotBand, RotCell } from '#shared/contracts/rot';
import type { Period } from '#shared/domain/period';
import { AGE_BANDS } from '#shared/domain/vocabulary';
import { ageReference, type AgeReference } from './age-reference';
import { countedShare, openedShare } from './count-shares';
import { rotModels } from './rot-models';
import { rotRegion } from './rot-regions';
import { rotZones } from './rot-zones';
import { sumOf, tallyCars, together, type ByBand } from './tally-cars';

/** What is asked of the rot under cars. */
export interface RotQuestion {
  period: Period;
  filters: JobFilters;
}

/** Rot by age, region, zone and model, regions beside a reference; one snapshot of the database. */
export function answerRot(
  db: ScopedDb,
  { period, filters }: RotQuestion,
  network: NetworkReference,
): RotAnswer {
  return db.snapshot(() => {
    const asked = { ...filters, ...period };
    const cars = readRotCars(db, asked);
    const tally = tallyCars(cars);
    const scope = db.scope.echo();
    const all = together(tally.byBranch.values());
    const regions = byRegion(db, scope.regions, tally.byBranch);
    const reference = ageReference(network, asked);
    const climates = readClimates(db, scope.regions);
    const newest = [...tally.byModel.values()].map((model) => model.newest.jobId);
    return {
      period,
      scope,
      jobs: cars.jobIds.length,
      reference: reference.kind,
      overall: countedShare(sumOf(all.cars), sumOf(all.withRot)),
      bands: rotBands(all, reference),
      cells: rotCells(regions),
      regions: regions.map(([region, own]) =>
        rotRegion(region, own, reference.cars, climates.get(region)),
      ),
      zones: rotZones(all.cars, tally.byPlaces),
      models: rotModels(tally.byModel, readSpellings(db, newest)),
      openedUp: openedShare(cars.bubbles),
    };
  });
}

type OfRegion = readonly [region: string, own: ByBand];

/** The cars of every region of the scope, also of those without any. */
function byRegion(
  db: ScopedDb,
  regions: readonly string[],
  byBranch: ReadonlyMap<number, ByBand>,
): OfRegion[] {
  return regions.map((region) => {
    const branches = db.scope.branches.filter((branch) => branch.region === region);
    return [region, together(branches.flatMap(({ id }) => byBranch.get(id) ?? []))];
  });
}

function rotBands(all: ByBand, reference: AgeReference): RotBand[] {
  return AGE_BANDS.flatMap((ageBand, band) => {
    const counted = countedShare(all.cars[band] as number, all.withRot[band] as number);
    const referenceShare = reference.shares[band] ?? null;
    return counted.cars > 0 ? [{ ageBand, ...counted, referenceShare }] : [];
  });
}

/** One row an age band and region that has a car (rule 32). */
function rotCells(regions: readonly OfRegion[]): RotCell[] {
  return AGE_BANDS.flatMap((ageBand, band) =>
    regions.flatMap(([region, own]) => {
      const counted = countedShare(own.cars[band] as number, own.withRot[band] as number);
      return counted.cars > 0 ? [{ ageBand, region, ...counted }] : [];
    }),
  );
}
