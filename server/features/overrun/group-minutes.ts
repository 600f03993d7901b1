import type { MinuteLists } from '#db/queries/overrun';

/** Deals the minutes of cars out to the groups they belong to; `groupOf` tells the group of a car's key. */
export function groupMinutes(
  { estimated, actual }: MinuteLists,
  keys: readonly (string | number)[],
  groupOf: (key: string | number) => string,
): Map<string, MinuteLists> {
  const numbers = new Map<string | number, number>();
  const names = new Map<string, number>();
  const sizes: number[] = [];
  const groups = new Int32Array(keys.length);
  keys.forEach((key, car) => {
    let group = numbers.get(key);
    if (group === undefined) {
      const name = groupOf(key);
      group = names.get(name) ?? names.size;
      names.set(name, group);
      numbers.set(key, group);
    }
    groups[car] = group;
    sizes[group] = (sizes[group] ?? 0) + 1;
  });
  const lists = sizes.map((size) => ({
    estimated: new Float64Array(size),
    actual: new Float64Array(size),
  }));
  const filled = new Int32Array(sizes.length);
  groups.forEach((group, car) => {
    const list = lists[group] as MinuteLists;
    const place = filled[group] as number;
    list.estimated[place] = estimated[car] as number;
    list.actual[place] = actual[car] as number;
    filled[group] = place + 1;
  });
  return new Map([...names].map(([name, group]) => [name, lists[group] as MinuteLists]));
}
