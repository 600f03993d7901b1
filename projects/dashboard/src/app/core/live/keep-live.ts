import { DestroyRef, effect, inject, untracked } from '@angular/core';
import type { LiveEvent } from '#shared/contracts/live';
import type { Reading } from '../api/reading';
import { Catalogue } from '../catalogue/catalogue';
import { ScopeState } from '../scope-line/scope-state';
import { LiveFeed, type LiveNote } from './live-feed';
import { LiveNews } from './live-news';
import { PersonBusy } from './person-busy';

/** Between two readings because of changes, ms. */
const APART = 10_000;
/** So long, ms, and a chance of as much again, a change waits for others; and all open pages do not ask at once. */
const GATHER = 300;
/** How often a person who is busy is looked at again, ms. */
const LOOK_AGAIN = 1_000;

type Refreshable = Pick<Reading<unknown>, 'refresh' | 'asking' | 'outdated'>;

/**
 * Keeps a reading (or a joined one) up to date: when something of these kinds changes at a branch of the page's scope, it is
 * asked again unnoticed, at most once in 10 s and not while the person is in the middle of something; what has come in is then
 * said in words. Call it in an injection context; it gives the reading back.
 */
export function keepLive<R extends Refreshable>(
  reading: R,
  ...kinds: readonly LiveEvent['kind'][]
): R {
  const scope = inject(ScopeState);
  const catalogue = inject(Catalogue);
  const news = inject(LiveNews);
  const person = inject(PersonBusy);
  /** Told, and not yet shown. */
  let waiting: LiveEvent[] = [];
  let due = false;
  /** What the answer under way will show. */
  let coming: LiveEvent[] | undefined;
  let notBefore = -Infinity;
  let timer: ReturnType<typeof setTimeout> | undefined;

  const isOfPage = ({ kind, branch }: LiveEvent): boolean => {
    if (!kinds.includes(kind)) return false;
    const { branches, regions } = { branches: scope.branches(), regions: scope.regions() };
    const region = catalogue.branches().find(({ code }) => code === branch)?.region;
    return (
      (branches.length === 0 || branches.includes(branch)) &&
      (regions.length === 0 || region === undefined || regions.includes(region))
    );
  };
  const lookAfter = (wait: number): void => {
    timer ??= setTimeout(look, Math.max(wait, notBefore - performance.now()));
  };
  const look = (): void => {
    timer = undefined;
    if (!due) return;
    if (person.now() || reading.asking()) {
      lookAfter(LOOK_AGAIN);
      return;
    }
    due = false;
    notBefore = performance.now() + APART;
    coming = waiting;
    waiting = [];
    reading.refresh();
    // A page that asks nothing at the moment has nothing to show.
    if (!reading.asking()) coming = undefined;
  };
  const hear = (note: LiveNote): void => {
    if (note !== 'anew') {
      if (!isOfPage(note)) return;
      waiting.push(note);
    }
    due = true;
    lookAfter(GATHER * (1 + Math.random()));
  };

  const leave = inject(LiveFeed).listen((note) => untracked(() => hear(note)));
  inject(DestroyRef).onDestroy(() => {
    leave();
    clearTimeout(timer);
  });
  effect(() => {
    if (reading.asking() || !coming) return;
    const events = coming;
    coming = undefined;
    if (!reading.outdated()) {
      untracked(() => news.tell(events));
      return;
    }
    // Not answered: these are still to be shown.
    waiting = [...events, ...waiting];
    due = true;
    lookAfter(APART);
  });
  return reading;
}
