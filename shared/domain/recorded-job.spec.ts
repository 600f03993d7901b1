import { folded, isRot, modelKey } from './recorded-job';

describe('isRot', () => {
  it.each([
    ['surface', undefined, false],
    ['surface', 'surface', false],
    ['surface', 'bubbling', true],
    ['surface', 'holed', true],
    ['bubbling', undefined, true],
    ['holed', 'holed', true],
  ] as const)('given rust seen as %s and worked as %s, answers %s', (seenAs, workedAs, rot) => {
    expect(isRot({ seenAs, workedAs })).toBe(rot);
  });
});

describe('modelKey', () => {
  it('given spellings that differ in case, spacing or composition, is one key (rule 33)', () => {
    const key = modelKey('Véla', 'Grand Tessock');
    expect(modelKey(' véla ', 'GRAND  tessock')).toBe(key);
    expect(modelKey('Ve\u0301la', 'Grand\u00a0Tessock')).toBe(key);
  });

  it('given words moved from make to model, is another key', () => {
    expect(modelKey('Vela Grand', 'Tessock')).not.toBe(modelKey('Vela', 'Grand Tessock'));
  });
});

describe('folded', () => {
  it('given text of mixed case and spacing, gives one small spelling', () => {
    expect(folded('  A\tB  c ')).toBe('a b c');
  });
});
