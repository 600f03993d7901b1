import { DestroyRef, inject, signal, type Signal } from '@angular/core';
import { lastValueFrom, map, type Observable, Subject, takeUntil, tap } from 'rxjs';
import type { Answer, Upload } from './api';
import { describeProblem, type Problem } from './problem';

/** How much of a file has gone. */
export interface Gone {
  readonly bytes: number;
  readonly of: number | undefined;
}

/** A file on its way to the server: how far it is, its trouble, and a way to call it back. */
export interface Sending<In, Out> {
  /** `undefined` while nothing is on its way. */
  readonly gone: Signal<Gone | undefined>;
  readonly problem: Signal<Problem | undefined>;
  /** Sends it; `undefined` when it failed (see `problem`), was called back or another one is under way. */
  run(input: In): Promise<Out | undefined>;
  cancel(): void;
  clear(): void;
}

/** Wraps an upload so that a form can show its progress; leaving the page calls it back. Call it in an injection context. */
export function sending<In, Out>(
  act: (input: In) => Observable<Upload<Out>>,
): Sending<In, Answer<Out>> {
  const gone = signal<Gone | undefined>(undefined);
  const problem = signal<Problem | undefined>(undefined);
  const back = new Subject<void>();
  inject(DestroyRef).onDestroy(() => back.next());
  return {
    gone: gone.asReadonly(),
    problem: problem.asReadonly(),
    cancel: () => back.next(),
    clear: () => problem.set(undefined),
    async run(input) {
      if (gone()) return undefined;
      gone.set({ bytes: 0, of: undefined });
      problem.set(undefined);
      const steps = act(input).pipe(
        tap((step) => {
          if (step.kind === 'going') gone.set({ bytes: step.bytes, of: step.of });
        }),
        map((step) => (step.kind === 'answered' ? step.answer : undefined)),
        takeUntil(back),
      );
      try {
        return await lastValueFrom(steps, { defaultValue: undefined });
      } catch (error) {
        problem.set(describeProblem(error));
        return undefined;
      } finally {
        gone.set(undefined);
      }
    },
  };
}
