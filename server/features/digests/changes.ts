import type { BranchCars, DigestSignal, LateAction } from '#db/queries/digests';
import type { Period } from '#shared/domain/period';
import { tellSignal } from '#shared/domain/tell-signal';
import type { DigestList } from './digest';
import { countedFirst, countedThen, day, inList, whole } from './in-words';

/** What stands and what changed in the branches of a scope. */
export interface Changes {
  today: string;
  /** Days whose changes are told, both included. */
  days: Period;
  /** Days whose cars are counted, both included. */
  carsOf: Period;
  /** Names of the regions by code. */
  regions: Readonly<Record<string, string>>;
  signals: readonly DigestSignal[];
  late: readonly LateAction[];
  branches: readonly BranchCars[];
}

/** More than this makes a mail that nobody reads to its end; the page has them all. */
const MOST_TOLD = 8;

/** Signals first noticed in the days told; one that ended in them too is told as over. */
export function newOf({ signals, days: { from, to } }: Changes): DigestSignal[] {
  return signals.filter(
    ({ openedOn, overOn }) => openedOn >= from && openedOn <= to && !isOverBy(overOn, to),
  );
}

/** Signals that ended in the days told. */
export function overOf({ signals, days: { from, to } }: Changes): DigestSignal[] {
  return signals.filter(({ overOn }) => overOn !== null && overOn >= from && overOn <= to);
}

/** Signals that stood at the end of the days told. */
export function standingOf({ signals, days: { to } }: Changes): DigestSignal[] {
  return signals.filter(({ openedOn, overOn }) => openedOn <= to && !isOverBy(overOn, to));
}

/** The same changes of one region. */
export function inRegion(changes: Changes, region: string): Changes {
  const here = (row: { region: string }): boolean => row.region === region;
  return {
    ...changes,
    signals: changes.signals.filter(here),
    late: changes.late.filter(here),
    branches: changes.branches.filter(here),
  };
}

/** Whether anything is new or over, silent, or late. */
export function hasChanges(changes: Changes): boolean {
  return (
    newOf(changes).length + overOf(changes).length + changes.late.length > 0 ||
    standingOf(changes).some(({ kind }) => kind === 'silence')
  );
}

/** What changed, which branches are silent or outside their funnel, and which actions are late. */
export function sayChanges(changes: Changes): string[] {
  const [fresh, over, standing] = [newOf(changes), overOf(changes), standingOf(changes)];
  const silent = namesOf(standing.filter(({ kind }) => kind === 'silence'));
  const outside = namesOf(standing.filter(({ kind }) => kind === 'left_funnel'));
  const { late } = changes;
  return [
    `${countedFirst(fresh.length, 'signal is new', 'signals are new')}, ${countedThen(over.length, 'is', 'are')} over and ${countedThen(standing.length, 'stands', 'stand')}.`,
    silent.length > 0
      ? `No jobs arrive from ${inList(silent)}.`
      : 'Jobs arrive from every branch as they usually do.',
    outside.length > 0
      ? `Outside what chance explains ${outside.length === 1 ? 'stands' : 'stand'} ${inList(outside)}.`
      : 'No branch stands outside what chance explains.',
    ...(late.length > 0
      ? [
          `${countedFirst(late.length, 'action is', 'actions are')} past ${late.length === 1 ? 'its' : 'their'} day.`,
        ]
      : []),
  ];
}

/** The new signals in their own words, those that are over, and the late actions. */
export function listChanges(changes: Changes): DigestList[] {
  return [
    listOf('New', newOf(changes).map(told)),
    listOf(
      'Over',
      overOf(changes).map(
        (signal) =>
          `${signal.branchName}: ${tellSignal(signal, signal.branchName).title}, since ${day(signal.since)}`,
      ),
    ),
    listOf(
      'Actions past their day',
      changes.late.map(
        ({ branchName, what, who, until }) =>
          `${branchName}: ${what} (${who}, until ${day(until)})`,
      ),
    ),
  ].filter(({ items }) => items.length > 0);
}

function told(signal: DigestSignal): string {
  const { title, sentence } = tellSignal(signal, signal.branchName);
  return `${title}. ${sentence}`;
}

function listOf(title: string, items: readonly string[]): DigestList {
  const rest = items.length - MOST_TOLD;
  if (rest <= 1) return { title, items };
  return { title, items: [...items.slice(0, MOST_TOLD), `and ${whole(rest)} more`] };
}

/** Names of branches, each once, in the order of their codes. */
function namesOf(signals: readonly DigestSignal[]): string[] {
  return [...new Map(signals.map(({ branch, branchName }) => [branch, branchName])).values()];
}

function isOverBy(overOn: string | null, day: string): boolean {
  return overOn !== null && overOn <= day;
}
