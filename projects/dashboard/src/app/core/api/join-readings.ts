import { computed, linkedSignal } from '@angular/core';
import type { Reading } from './reading';

type Parts = Readonly<Record<string, Reading<unknown>>>;
/** The values of several readings by their names. */
export type Joined<P extends Parts> = {
  readonly [K in keyof P]: P[K] extends Reading<infer T> ? T : never;
};

/**
 * Several calls that make one view, as one reading: its value changes only when all of them have answered, so that a page never
 * shows the answer of one question beside the answer of another. The first trouble among them is its trouble.
 */
export function joinReadings<P extends Parts>(parts: P): Omit<Reading<Joined<P>>, 'etag'> {
  const all = Object.values(parts);
  const busy = computed(() => all.some((part) => part.asking()));
  const noticed = computed(() => all.some((part) => part.loading() || part.refreshing()));
  const outdated = computed(() => all.some((part) => part.outdated()));
  const problem = computed(() => all.map((part) => part.problem()).find((one) => one));
  const value = linkedSignal<Joined<P> | 'as before' | undefined, Joined<P> | undefined>({
    source: () => {
      // Every part is read, so that a change of any is seen.
      const values = all.map((part) => part.value());
      if (busy() || outdated()) return 'as before';
      if (values.some((one) => one === undefined)) return undefined;
      return Object.fromEntries(
        Object.entries(parts).map(([name, part]) => [name, part.value()]),
      ) as Joined<P>;
    },
    computation: (now, before) => (now === 'as before' ? before?.value : now),
  });
  return {
    value: value.asReadonly(),
    loading: computed(() => busy() && value() === undefined),
    refreshing: computed(() => noticed() && value() !== undefined),
    problem: computed(() => (busy() ? undefined : problem())),
    reload: () => all.forEach((part) => part.reload()),
    refresh: () => all.forEach((part) => part.refresh()),
    asking: busy,
    outdated,
  };
}
