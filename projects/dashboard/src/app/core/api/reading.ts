import { computed, linkedSignal, type Signal } from '@angular/core';
import { rxResource } from '@angular/core/rxjs-interop';
import type { Observable } from 'rxjs';
import type { Answer } from './api';
import { describeProblem, type Problem } from './problem';

/** A call kept answered, as signals. */
export interface Reading<T> {
  /** The newest answer; the former one stays while the next is under way, and goes when that fails. */
  readonly value: Signal<T | undefined>;
  readonly etag: Signal<string | undefined>;
  /** No answer to show yet. */
  readonly loading: Signal<boolean>;
  /** A former answer is shown while a newer one is under way. */
  readonly refreshing: Signal<boolean>;
  readonly problem: Signal<Problem | undefined>;
  /** Asks again with the same request. */
  reload(): void;
}

/** Builds a reading on Angular's resource, which stays inside this folder while it is experimental. */
export function readingOf<R, T>(
  request: () => R | undefined,
  ask: (request: R) => Observable<Answer<T>>,
): Reading<T> {
  // Two requests that say the same are the same: no second call for an equal scope.
  const params = computed(request, { equal: (a, b) => JSON.stringify(a) === JSON.stringify(b) });
  const resource = rxResource({
    params: () => params(),
    stream: ({ params: asked }) => ask(asked as R),
  });
  const answer = linkedSignal<Answer<T> | 'waiting' | undefined, Answer<T> | undefined>({
    source: () => {
      if (resource.hasValue()) return resource.value();
      return resource.isLoading() ? 'waiting' : undefined;
    },
    computation: (now, before) => (now === 'waiting' ? before?.value : now),
  });
  const value = computed(() => answer()?.body);
  return {
    value,
    etag: computed(() => answer()?.etag),
    loading: computed(() => resource.isLoading() && answer() === undefined),
    refreshing: computed(() => resource.isLoading() && answer() !== undefined),
    problem: computed(() => {
      const error = resource.error();
      return error && !resource.isLoading() ? describeProblem(error) : undefined;
    }),
    reload: () => void resource.reload(),
  };
}
