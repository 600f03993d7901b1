import { comparedBranch, sideBySideAnswer } from '../../testing/branches-answers';
import { chosenBeside, sideBySide } from './side-by-side';

const WORDS = { branchName: (code: string) => code, productName: (code: string) => `wax ${code}` };

describe('sideBySide', () => {
  it('two branches: the largest difference and the steps that make it', () => {
    expect(sideBySide(sideBySideAnswer(), WORDS).sentence).toBe(
      'SKU lies 12 points above HAV; refit gives 9 points and its mix of cars 2 points.',
    );
  });

  it('any branches: from the reference, the steps add up to the value', () => {
    const { rows } = sideBySide(sideBySideAnswer(), WORDS);
    const sum = rows.at(-1)!;
    for (const [index, value] of sum.values.entries()) {
      const added = rows.slice(0, -1).reduce((all, row) => all + (row.values[index] ?? 0), 0);
      expect(added).toBeCloseTo(value!, 12);
    }
    expect(rows[0]!.label).toBe('the whole network');
  });

  it('a branch with too few cars: says so and has no steps', () => {
    const few = comparedBranch(
      'TEG',
      {},
      { value: null, expected: null, steps: null, flag: 'too_few' },
    );
    const { rows, sentence } = sideBySide(
      sideBySideAnswer({ branches: [comparedBranch('HAV', { mix: 0.02 }), few] }),
      WORDS,
    );
    expect(rows.at(-1)!.texts[1]).toBe('too few cars yet');
    expect(sentence).toBe('HAV lies 2 points above the reference; its mix of cars gives 2 points.');
  });

  it('products: are named as the catalogue does', () => {
    const { rows } = sideBySide(
      sideBySideAnswer({ measure: 'product', branches: [comparedBranch('HAV', { CW1: 0.02 })] }),
      WORDS,
    );
    expect(rows[1]!.label).toBe('wax CW1');
  });
});

describe('chosenBeside', () => {
  it('codes of the URL: those that are there, four at most; one that is alone by itself', () => {
    expect(chosenBeside('SKU,HAV,NO', ['HAV', 'SKU', 'TEG'])).toEqual(['HAV', 'SKU']);
    expect(chosenBeside('A,B,C,D,E', ['A', 'B', 'C', 'D', 'E'])).toEqual(['A', 'B', 'C', 'D']);
    expect(chosenBeside(['HAV', 'SKU'], ['HAV', 'SKU', 'TEG'])).toEqual(['HAV', 'SKU']);
    expect(chosenBeside(undefined, ['HAV'])).toEqual(['HAV']);
    expect(chosenBeside(undefined, ['HAV', 'SKU'])).toEqual([]);
  });
});
