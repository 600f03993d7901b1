import { fieldWords, placeWords } from './field-words';
import type { KnownNames } from './known-names';
import { pointerNames } from './pointer';
import { NOTHING, valueWords } from './value-words';

/** A field's value before and after, wherever it was changed. */
export interface Change {
  readonly path: string;
  readonly before: unknown;
  readonly after: unknown;
}

/** A change as it is read. */
export interface ChangeRow {
  readonly path: string;
  readonly field: string;
  readonly before: string;
  readonly after: string;
}

/** Changes in words, in the order they came in. A finding that came or went says itself where it is. */
export function changeRows(changes: readonly Change[], known: KnownNames): readonly ChangeRow[] {
  const places = placesIn(changes);
  const all: KnownNames = { ...known, placeOf: (ref) => known.placeOf(ref) ?? places.get(ref) };
  return changes.map(({ path, before, after }) => ({
    path,
    field: fieldWords(path, all),
    before: valueWords(path, before, all),
    after: valueWords(path, after, all),
  }));
}

/** Whether a cell of the table holds nothing, and so is said quietly. */
export function isNothing(words: string): boolean {
  return words === NOTHING;
}

function placesIn(changes: readonly Change[]): ReadonlyMap<string, string> {
  const parts = new Map<string, { zone?: unknown; side?: unknown }>();
  for (const { path, before, after } of changes) {
    const [list, ref, field] = pointerNames(path);
    if (list !== 'findings' || ref === undefined) continue;
    if (field !== 'zone' && field !== 'side') continue;
    parts.set(ref, { ...parts.get(ref), [field]: after ?? before });
  }
  const places = new Map<string, string>();
  for (const [ref, { zone, side }] of parts) {
    const words = placeWords(zone, side);
    if (words) places.set(ref, words);
  }
  return places;
}
