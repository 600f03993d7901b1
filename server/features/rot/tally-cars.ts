import type { RotCars } from '#db/queries/rot';
import { AGE_BANDS } from '#shared/domain/vocabulary';

/** Cars and cars with rot, a place an age band. */
export interface ByBand {
  cars: number[];
  withRot: number[];
}

/** The cars of one model, and the one of them that was completed last: its spelling is the one shown (rule 33). */
export interface ModelTally extends ByBand {
  newest: { completedOn: string; jobId: number };
}

/** The cars of a question counted by everything it is answered by. */
export interface RotTally {
  byBranch: ReadonlyMap<number, ByBand>;
  /** Cars by band, for every set of places in which any car has rot. */
  byPlaces: ReadonlyMap<number, number[]>;
  byModel: ReadonlyMap<string, ModelTally>;
}

/** Counts every car once. */
export function tallyCars(cars: RotCars): RotTally {
  const byBranch = new Map<number, ByBand>();
  const byPlaces = new Map<number, number[]>();
  const byModel = new Map<string, ModelTally>();
  for (let car = 0; car < cars.jobIds.length; car += 1) {
    const band = cars.bands[car] as number;
    const places = cars.places[car] as number;
    count(ensure(byBranch, cars.branchIds[car] as number, nobody), band, places);
    const model = ensure(byModel, cars.modelKeys[car] as string, noModel);
    count(model, band, places);
    keepNewest(model, cars.completedOn[car] as string, cars.jobIds[car] as number);
    if (places > 0) add(ensure(byPlaces, places, noBands), band);
  }
  return { byBranch, byPlaces, byModel };
}

/** Some groups of cars as one. */
export function together(groups: Iterable<ByBand>): ByBand {
  const all = nobody();
  for (const { cars, withRot } of groups) {
    cars.forEach((n, band) => add(all.cars, band, n));
    withRot.forEach((n, band) => add(all.withRot, band, n));
  }
  return all;
}

/** How many of anything there are over all bands. */
export function sumOf(bands: readonly number[]): number {
  return bands.reduce((sum, n) => sum + n, 0);
}

function count(group: ByBand, band: number, places: number): void {
  add(group.cars, band);
  if (places > 0) add(group.withRot, band);
}

function keepNewest({ newest }: ModelTally, completedOn: string, jobId: number): void {
  if (completedOn < newest.completedOn) return;
  if (completedOn === newest.completedOn && jobId < newest.jobId) return;
  newest.completedOn = completedOn;
  newest.jobId = jobId;
}

function add(bands: number[], band: number, n = 1): void {
  bands[band] = (bands[band] ?? 0) + n;
}

function noBands(): number[] {
  return AGE_BANDS.map(() => 0);
}

function nobody(): ByBand {
  return { cars: noBands(), withRot: noBands() };
}

function noModel(): ModelTally {
  return { ...nobody(), newest: { completedOn: '', jobId: 0 } };
}

function ensure<Key, Value>(map: Map<Key, Value>, key: Key, make: () => Value): Value {
  let value = map.get(key);
  if (value === undefined) map.set(key, (value = make()));
  return value;
}
