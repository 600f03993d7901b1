import type { Params } from '@angular/router';
import type { Signal } from '#shared/contracts/signals';
import { isoWeek } from '#shared/domain/calendar';
import { tellSignal } from '#shared/domain/tell-signal';
import type { BranchMeasure, SignalKind } from '#shared/domain/vocabulary';
import {
  formatCars,
  formatDate,
  formatInstantDay,
  formatShortDate,
  formatWeek,
} from '../../ui/format';

/** Where else on the product a signal can be looked at. */
export interface LeadsTo {
  readonly words: string;
  readonly link: string;
  readonly query: Params;
}

/** A signal as the list says it. */
export interface SignalRow {
  readonly key: string;
  readonly of: Signal;
  /** Danger to people. */
  readonly danger: boolean;
  readonly title: string;
  readonly sentence: string;
  readonly since: string;
  /** "12 cars", empty where there are none. */
  readonly cars: string;
  readonly stands: string;
  /** What was said about it, and by whom. */
  readonly note: { readonly text: string; readonly signed: string } | undefined;
  readonly leadsTo: LeadsTo;
  /** Query that opens the form to agree an action about it. */
  readonly action: Params;
}

/** Tells one signal from every other. */
export function keyOfSignal({ branch, id }: Pick<Signal, 'branch' | 'id'>): string {
  return `${branch}/${id}`;
}

/** Whether it tells of something that can hurt somebody. */
export function canHurt({ kind }: Pick<Signal, 'kind'>): boolean {
  return kind === 'come_backs_due';
}

/** The measure that an action about a signal would watch. */
export function measureOf({ kind, measure }: Pick<Signal, 'kind' | 'measure'>): BranchMeasure {
  switch (kind) {
    case 'left_funnel':
      return measure ?? 'margin';
    case 'drift_overrun':
      return 'overrun';
    case 'drift_claims':
      return 'claims';
    case 'come_backs_due':
      return 'rot';
    default:
      return 'margin';
  }
}

/** Turns a signal into its words. */
export function signalRow(of: Signal, branchName: string): SignalRow {
  const { title, sentence } = tellSignal(of, branchName);
  return {
    key: keyOfSignal(of),
    of,
    danger: canHurt(of),
    title,
    sentence,
    since: sinceWords(of),
    cars: of.cars === 0 ? '' : formatCars(of.cars),
    stands: standWords(of),
    note: of.acknowledged
      ? {
          text: of.acknowledged.note,
          signed: `${of.acknowledged.by}, ${formatInstantDay(of.acknowledged.at)}`,
        }
      : undefined,
    leadsTo: leadsTo(of),
    action: { branch: of.branch, measure: measureOf(of), signal: of.id },
  };
}

function sinceWords({ kind, since }: Signal): string {
  return ofWeeks(kind)
    ? `since ${formatWeek(isoWeek(since)).toLowerCase()}`
    : `since ${formatDate(since)}`;
}

function standWords({ state, overOn, openedOn }: Signal): string {
  switch (state) {
    case 'open':
      return `open, noticed ${formatShortDate(openedOn)}`;
    case 'acknowledged':
      return 'seen';
    case 'over':
      return overOn ? `over since ${formatShortDate(overOn)}` : 'over';
  }
}

function ofWeeks(kind: SignalKind): boolean {
  return kind === 'week_outside' || kind === 'run_of_eight';
}

function leadsTo({ kind, branch, since, measure }: Signal): LeadsTo {
  switch (kind) {
    case 'come_backs_due':
      return { words: 'The branch’s come-backs', link: '/come-backs', query: { branch } };
    case 'unbilled':
      return { words: 'Not billed, in Jobs', link: '/jobs', query: { branch, unbilled: 'true' } };
    case 'week_outside':
    case 'run_of_eight':
      return {
        words: kind === 'week_outside' ? 'The week' : 'Its first week',
        link: '/this-week',
        query: { branch, week: isoWeek(since) },
      };
    case 'left_funnel':
      return { words: 'The branches’ funnel', link: '/branches', query: { measure } };
    case 'drift_overrun':
      return { words: 'The branch’s overruns', link: '/overruns', query: { branch } };
    case 'drift_claims':
      return { words: 'The branch’s claims', link: '/claims', query: { branch } };
    case 'silence':
    case 'odd_values':
      return { words: 'The branch’s jobs', link: '/jobs', query: { branch } };
  }
}
