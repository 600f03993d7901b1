/** What stands at the end of a path: nothing is null. */
export type Leaf = string | number | boolean | null;

/** One field that differs: where, what stood there, what stands there now. */
export interface Difference<Value = Leaf> {
  /** JSON pointer (RFC 6901). */
  path: string;
  before: Value;
  after: Value;
}

/** Fields by their JSON pointer, in the order in which they stand. Lists are taken by place; what is undefined is left out. */
export function flatFields(value: unknown, path = ''): Map<string, Leaf> {
  const fields = new Map<string, Leaf>();
  collect(value, path, fields);
  return fields;
}

/** What differs between two sets of fields, in the order of the later one with what is gone at its place among the earlier. */
export function differences<Value>(
  before: ReadonlyMap<string, Value>,
  after: ReadonlyMap<string, Value>,
  same: (a: Value | null, b: Value | null) => boolean = (a, b) => a === b,
): Difference<Value | null>[] {
  return mergedKeys([...before.keys()], [...after.keys()]).flatMap((path) => {
    const change = { path, before: before.get(path) ?? null, after: after.get(path) ?? null };
    return same(change.before, change.after) ? [] : [change];
  });
}

/** One step of a JSON pointer. */
export function pointerStep(part: string | number): string {
  return `/${String(part).replaceAll('~', '~0').replaceAll('/', '~1')}`;
}

function collect(value: unknown, path: string, fields: Map<string, Leaf>): void {
  if (value === undefined) return;
  if (typeof value !== 'object' || value === null) {
    fields.set(path, value as Leaf);
    return;
  }
  for (const [key, inner] of Object.entries(value)) {
    collect(inner, path + pointerStep(key), fields);
  }
}

/** Every key once: those that both have in the order of the later list, one that is gone after the key it stood behind. */
function mergedKeys(before: readonly string[], after: readonly string[]): string[] {
  const kept = new Set(after);
  const goneBehind = new Map<string, string[]>();
  let last = '';
  for (const key of before) {
    if (kept.has(key)) last = key;
    else goneBehind.set(last, [...(goneBehind.get(last) ?? []), key]);
  }
  return [
    ...(goneBehind.get('') ?? []),
    ...after.flatMap((key) => [key, ...(goneBehind.get(key) ?? [])]),
  ];
}
