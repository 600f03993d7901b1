import {
  findingPath,
  headingOf,
  moveFinding,
  onMap,
  removeFinding,
  setFinding,
} from './findings-edit';

const LEFT = { zone: 'sill_inner', side: 'left' } as const;

describe('findings of a draft', () => {
  it('set, given two at the same place, have references of their own and say nothing of load', () => {
    const first = setFinding({}, LEFT);
    const second = setFinding(first.document, LEFT);
    expect([first.ref, second.ref]).toEqual(['sill_inner/left/1', 'sill_inner/left/2']);
    expect(second.document.findings?.[0]).toEqual({ ref: first.ref, ...LEFT });
  });

  it('moved, given another place, keep their reference, so that photos stay with them', () => {
    const { document, ref } = setFinding({}, LEFT);
    const moved = moveFinding(document, ref, { zone: 'floor', side: 'right' });
    expect(moved.findings).toEqual([{ ref, zone: 'floor', side: 'right' }]);
    expect(findingPath(ref, 'seenAs')).toBe('/findings/sill_inner~1left~11/seenAs');
  });

  it('removed, given the first of two, leave the other and its reference free', () => {
    const first = setFinding({}, LEFT);
    const both = setFinding(first.document, LEFT).document;
    const left = removeFinding(both, first.ref);
    expect(left.findings?.map(({ ref }) => ref)).toEqual(['sill_inner/left/2']);
    expect(setFinding(left, LEFT).ref).toBe('sill_inner/left/1');
  });

  it('named, given one being written or the next to come, are counted in words', () => {
    const first = setFinding({}, LEFT);
    expect(headingOf({}, undefined)).toBe('First finding');
    expect(headingOf(first.document, first.ref)).toBe('First finding');
    expect(headingOf(first.document, undefined)).toBe('Second finding');
  });

  it('on the map, given no condition yet, are drawn as the least', () => {
    const { document } = setFinding({}, LEFT);
    expect(onMap(document.findings ?? [])[0]).toMatchObject({ seenAs: 'surface', ...LEFT });
  });
});
