import type { JobRow } from '#shared/contracts/job-list';

/** A make and the models of it that were worked on lately. */
export interface KnownMake {
  readonly make: string;
  readonly models: readonly string[];
}

/** Makes and models of the given jobs, to be offered while a car is typed; each once, in their order by name. */
export function knownCars(jobs: readonly Pick<JobRow, 'vehicle'>[]): readonly KnownMake[] {
  const models = new Map<string, Set<string>>();
  for (const { vehicle } of jobs) {
    models.set(vehicle.make, (models.get(vehicle.make) ?? new Set()).add(vehicle.model));
  }
  return [...models]
    .map(([make, names]) => ({ make, models: [...names].sort(byName) }))
    .sort((a, b) => byName(a.make, b.make));
}

/** Models to offer for what is typed as the make; of all makes while it is none of them. */
export function modelsFor(known: readonly KnownMake[], typed: string): readonly string[] {
  const make = typed.trim().toLowerCase();
  const own = known.find((one) => one.make.toLowerCase() === make);
  return own ? own.models : [...new Set(known.flatMap(({ models }) => models))].sort(byName);
}

/** The package that was worked most often in the given jobs; the first of equals. */
export function usualPackage(jobs: readonly Pick<JobRow, 'package'>[]): string | undefined {
  const counts = new Map<string, number>();
  for (const job of jobs) counts.set(job.package, (counts.get(job.package) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0];
}

function byName(a: string, b: string): number {
  return a.localeCompare(b);
}
