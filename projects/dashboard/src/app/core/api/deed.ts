import { signal, type Signal } from '@angular/core';
import { firstValueFrom, type Observable } from 'rxjs';
import { describeProblem, type Problem } from './problem';

/** Something a person does by pressing a button: at most one at a time, its trouble kept until the next try. */
export interface Deed<In, Out> {
  readonly busy: Signal<boolean>;
  readonly problem: Signal<Problem | undefined>;
  /** Does it; `undefined` when it failed (see `problem`) or was already under way. */
  run(input: In): Promise<Out | undefined>;
  /** Forgets the last trouble. */
  clear(): void;
}

/** Wraps a call so that a form can show that it is under way and why it failed. */
export function deed<In, Out>(act: (input: In) => Observable<Out>): Deed<In, Out> {
  const busy = signal(false);
  const problem = signal<Problem | undefined>(undefined);
  return {
    busy: busy.asReadonly(),
    problem: problem.asReadonly(),
    clear: () => problem.set(undefined),
    async run(input) {
      if (busy()) return undefined;
      busy.set(true);
      problem.set(undefined);
      try {
        return await firstValueFrom(act(input));
      } catch (error) {
        problem.set(describeProblem(error));
        return undefined;
      } finally {
        busy.set(false);
      }
    },
  };
}
