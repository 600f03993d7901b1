import type { ImportedFile, ImportKind } from '#shared/contracts/imports';
import { formatCounted, formatNumber } from '../../ui/format';

export type ImportState = ImportedFile['state'];

/** What a file holds, as the choice says it. */
export const KIND_NAMES: Readonly<Record<ImportKind, string>> = {
  jobs: 'finished jobs',
  claims: 'claims',
};

/** Where a file stands, in a list of files. */
export const STATE_NAMES: Readonly<Record<ImportState, string>> = {
  checking: 'being checked',
  ready: 'checked, not written',
  writing: 'being written',
  done: 'written',
  cancelled: 'stopped by a person',
  stopped: 'broke off',
  failed: 'could not be read',
};

/** Work that goes on by itself on the server. */
export function isUnderWay({ state }: Pick<ImportedFile, 'state'>): boolean {
  return state === 'checking' || state === 'writing';
}

/** Rows of a file by what they are: `1,181 cars`, `1 claim`. */
export function countOf(kind: ImportKind, count: number): string {
  return kind === 'jobs'
    ? formatCounted(count, 'car', 'cars')
    : formatCounted(count, 'claim', 'claims');
}

/** The size of a file as people read it: `12.3 MB`, `48 kB`. */
export function sizeWords(bytes: number): string {
  if (bytes >= 100_000) return `${formatNumber(bytes / 1e6, 1)}\u202fMB`;
  return `${formatNumber(Math.max(1, Math.ceil(bytes / 1000)), 0)}\u202fkB`;
}

/** New and changed rows: what confirming writes. */
export function toWrite({ counts }: Pick<ImportedFile, 'counts'>): number {
  return counts.new + counts.changed;
}

/** Whether the writing of an ended file had begun: then it goes on from there, and is not read another way. */
export function hasBegun({ progress }: Pick<ImportedFile, 'progress'>): boolean {
  return progress.done > 0;
}

/** Rows that were written so far. */
export function writtenOf({ written }: Pick<ImportedFile, 'written'>): number {
  return written.created + written.replaced;
}
