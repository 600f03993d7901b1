import { differences, flatFields } from './flat-fields';

describe('flatFields', () => {
  it('given lists and objects, names each end by its pointer', () => {
    const fields = flatFields({ a: { 'b/c': 1, 'd~e': [true, null] }, gone: undefined });
    expect([...fields]).toEqual([
      ['/a/b~1c', 1],
      ['/a/d~0e/0', true],
      ['/a/d~0e/1', null],
    ]);
  });

  it('given no object, names it by the path it was given', () => {
    expect([...flatFields('note', '/text')]).toEqual([['/text', 'note']]);
  });
});

describe('differences', () => {
  it('given fields changed, gone and new, tells each at its place', () => {
    const before = flatFields({ a: 1, b: 2, c: 3, d: 4 });
    const after = flatFields({ a: 1, c: 5, e: 6, d: 4 });
    expect(differences(before, after)).toEqual([
      { path: '/b', before: 2, after: null },
      { path: '/c', before: 3, after: 5 },
      { path: '/e', before: null, after: 6 },
    ]);
  });

  it('given what was null and is absent, tells no change', () => {
    expect(differences(flatFields({ a: null }), flatFields({}))).toEqual([]);
  });
});
