import { type Signal, signal } from '@angular/core';
import { type Climate, climateTyped } from '../../ui/set-up/region-changes';
import type { Typed } from '../../ui/set-up/field';

/** The climate that stands in a form, as long as all of it does. */
export interface TypedClimate {
  readonly climate: Signal<Climate | undefined>;
  take(typed: Typed): void;
}

/** Follows what is typed of a region's air. */
export function typedClimate(): TypedClimate {
  const climate = signal<Climate | undefined>(undefined);
  return { climate: climate.asReadonly(), take: (typed) => climate.set(climateTyped(typed)) };
}
