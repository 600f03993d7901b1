import { computed, linkedSignal, type Signal, untracked } from '@angular/core';
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
  /** Asks again unnoticed: what is shown stays as it is until the newer answer is there, and also when none comes. */
  refresh(): void;
  /** An answer is under way, noticed or not. */
  readonly asking: Signal<boolean>;
  /** What is shown is older than the last `refresh`, which failed. */
  readonly outdated: Signal<boolean>;
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
  /** Whether the last time was asked unnoticed; another request is always noticed. */
  const quiet = linkedSignal({ source: params, computation: () => false });
  const answer = linkedSignal<Answer<T> | 'as before' | undefined, Answer<T> | undefined>({
    source: () => {
      if (resource.hasValue()) return resource.value();
      return resource.isLoading() || quiet() ? 'as before' : undefined;
    },
    computation: (now, before) =>
      // Where nothing has changed, nothing on the page is drawn again.
      now === 'as before' || (untracked(quiet) && isSame(now, before?.value)) ? before?.value : now,
  });
  const noticed = computed(() => resource.isLoading() && !(quiet() && answer() !== undefined));
  const problem = computed(() => {
    const error = resource.error();
    return error && !resource.isLoading() ? describeProblem(error) : undefined;
  });
  const value = computed(() => answer()?.body);
  return {
    value,
    etag: computed(() => answer()?.etag),
    loading: computed(() => noticed() && answer() === undefined),
    refreshing: computed(() => noticed() && answer() !== undefined),
    problem: computed(() => (quiet() && answer() !== undefined ? undefined : problem())),
    reload: () => {
      quiet.set(false);
      resource.reload();
    },
    refresh: () => {
      if (resource.isLoading()) return;
      quiet.set(true);
      resource.reload();
    },
    asking: resource.isLoading,
    outdated: computed(() => quiet() && problem() !== undefined),
  };
}

function isSame<T>(now: Answer<T> | undefined, before: Answer<T> | undefined): boolean {
  return now?.etag === before?.etag && JSON.stringify(now?.body) === JSON.stringify(before?.body);
}
