import type { JobDraft } from '#shared/contracts/under-way';

/** A draft as the form's fields reach into it: its content, and the branch's reference. */
export type DraftDocument = JobDraft & { readonly jobRef?: string };

type Loose = Readonly<Record<string, unknown>>;

/** What names an item of a list; a field reaches it by that, whatever its place. */
const KEYS: Readonly<Record<string, string>> = {
  products: 'product',
  consumables: 'kind',
  findings: 'ref',
};

/** One step of a field's path, so that a slash inside of a reference is none. */
export function pathPart(key: string): string {
  return `/${key.replaceAll('~', '~0').replaceAll('/', '~1')}`;
}

/** What stands at a path such as `/vehicle/make` or `/products/CW1/ml`; `undefined` where nothing does. */
export function valueAt(document: DraftDocument, path: string): unknown {
  let here: unknown = document;
  let key: string | undefined;
  for (const part of partsOf(path)) {
    if (Array.isArray(here)) here = here[placeIn(here, part, key)];
    else here = isObject(here) ? here[part] : undefined;
    key = KEYS[part];
  }
  return here;
}

/** The document with another value at a path; `undefined` takes the field away, and a list's item with its last field. */
export function withValue(document: DraftDocument, path: string, value: unknown): DraftDocument {
  return changed(document, partsOf(path), value, undefined) as DraftDocument;
}

/** A path of the finished job, by place in its lists, as the path of the form's field, by key. */
export function keyedPath(document: DraftDocument, path: string): string {
  let here: unknown = document;
  let key: string | undefined;
  let keyed = '';
  for (const part of partsOf(path)) {
    const item: unknown = Array.isArray(here) ? here[Number(part)] : undefined;
    const named = key !== undefined && isObject(item) ? item[key] : undefined;
    keyed += pathPart(typeof named === 'string' ? named : part);
    here = Array.isArray(here) ? item : isObject(here) ? here[part] : undefined;
    key = KEYS[part];
  }
  return keyed;
}

function changed(here: unknown, parts: readonly string[], value: unknown, key?: string): unknown {
  const [part, ...rest] = parts;
  if (part === undefined) return value;
  if (key !== undefined || Array.isArray(here)) {
    return listChanged(Array.isArray(here) ? here : [], part, rest, value, key);
  }
  const object: Loose = isObject(here) ? here : {};
  const next = changed(object[part], rest, value, KEYS[part]);
  const { [part]: _gone, ...others } = object;
  if (next !== undefined) return { ...object, [part]: next };
  return Object.keys(others).length > 0 ? others : undefined;
}

function listChanged(
  list: readonly unknown[],
  part: string,
  rest: readonly string[],
  value: unknown,
  key?: string,
): unknown {
  const place = placeIn(list, part, key);
  const item: unknown = list[place] ?? (key === undefined ? {} : { [key]: part });
  const next = changed(item, rest, value);
  const bare =
    next === undefined ||
    (key !== undefined && key !== 'ref' && isObject(next) && Object.keys(next).length === 1);
  if (bare) {
    const left = list.filter((_, index) => index !== place);
    return left.length > 0 ? left : undefined;
  }
  return place < list.length
    ? list.map((each, index) => (index === place ? next : each))
    : [...list, next];
}

/** Where an item is in its list; its end when it is not there yet. */
function placeIn(list: readonly unknown[], part: string, key: string | undefined): number {
  if (key === undefined) return Number(part);
  const place = list.findIndex((item) => isObject(item) && item[key] === part);
  return place < 0 ? list.length : place;
}

function partsOf(path: string): string[] {
  return path
    .slice(1)
    .split('/')
    .map((part) => part.replaceAll('~1', '/').replaceAll('~0', '~'));
}

function isObject(value: unknown): value is Loose {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
