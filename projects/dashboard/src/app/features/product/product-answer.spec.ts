import {
  fewUse,
  noProducts,
  productBranch,
  productsAnswer,
  productUse,
} from '../../testing/product-answers';
import type { AnswerPart } from '../../ui/answer/answer';
import { answerProducts } from './product-answer';
import type { ProductWords } from './product-words';

const words: ProductWords = {
  currency: 'EUR',
  branchName: (code) => ({ HAV: 'Havnsund', BRE: 'Brekka', MAR: 'Marrow' })[code] ?? code,
  packageWord: (code) => code.replace('_', ' '),
  productName: (code) => (code === 'CW1' ? 'Cavity wax' : code),
  isWax: () => true,
};

function say(more: Parameters<typeof productsAnswer>[0] = {}) {
  const { sentence, second } = answerProducts(productsAnswer(more), words, { branch: ['HAV'] });
  return { first: text(sentence), second: text(second), parts: second };
}

function text(parts: readonly AnswerPart[]): string {
  return parts
    .map((part) => {
      if (typeof part === 'string') return part;
      return 'figure' in part ? part.figure : 'quiet' in part ? part.quiet : part.text;
    })
    .join('')
    .replaceAll('\u202f', ' ');
}

describe('answerProducts', () => {
  it('one branch: its ratio with interval and cars, cost a car, and where cars got too little', () => {
    const { first, second } = say();
    expect(first).toBe('94 % of the norm went in (92–96 %, 412 cars), €63.40 of product a car.');
    expect(second).toBe(
      'Cavity wax in full hatchbacks: 18 % of 120 cars got less than 70 % of the norm.',
    );
  });

  it('the cars under: lead to Jobs, in the page’s scope and dates', () => {
    expect(say().parts[1]).toEqual({
      text: '18\u202f% of 120 cars',
      link: '/jobs',
      query: {
        branch: ['HAV'],
        from: '2025-08-04',
        to: '2026-02-01',
        product: 'CW1',
        use: 'under',
        package: 'full',
        bodyType: 'hatchback',
      },
    });
  });

  it('cars that got none at all: counted among those under', () => {
    const use = [productUse({ cars: 100, carsListing: 96, under: 5, underShare: 0.05 })];
    expect(say({ use }).second).toContain('less than 70 % of the norm, 4 of them none at all.');
  });

  it('all of those under got none: said so', () => {
    const use = [productUse({ cars: 100, carsListing: 96, under: 4, underShare: 0.04 })];
    expect(say({ use }).second).toBe(
      'Cavity wax in full hatchbacks: 4 % of 100 cars got none at all.',
    );
  });

  it('three thin cars of nine beside twenty of fifty: the twenty are told', () => {
    const use = [
      productUse({ bodyType: 'van', cars: 9, under: 3, underShare: 3 / 9 }),
      productUse({ cars: 50, under: 20, underShare: 0.4 }),
    ];
    expect(say({ use }).second).toContain('in full hatchbacks: 40 % of 50 cars');
  });

  it('one or two of each kind: told of the product as a whole, and led to those cars', () => {
    const use = [
      productUse({ cars: 6, carsListing: 5, under: 1, underShare: 1 / 6 }),
      productUse({ bodyType: 'van', cars: 94, carsListing: 94, under: 2, underShare: 2 / 94 }),
    ];
    const { second, parts } = say({ use });
    expect(second).toBe(
      'Cavity wax: 3 % of 100 cars got less than 70 % of the norm, 1 of them none at all.',
    );
    expect(parts[1]).toMatchObject({ query: { product: 'CW1', use: 'under' } });
    expect(parts[1]).not.toHaveProperty('query.bodyType');
  });

  it('nobody under, or too few cars to say: says that no car was', () => {
    const use = [productUse({ under: 0, underShare: 0 }), fewUse()];
    expect(say({ use }).second).toBe('No car got less than 70 % of the norm of any product.');
  });

  it('several branches: those furthest from the norm whose interval misses it, by name', () => {
    const branches = [
      productBranch('BRE', { ratioToNorm: 0.81, lower: 0.79, upper: 0.83 }),
      productBranch('HAV', { ratioToNorm: 0.97, lower: 0.95, upper: 0.99 }),
      productBranch('MAR', { ratioToNorm: 1.08, lower: 1.04, upper: 1.12 }),
      productBranch('OYA', { ratioToNorm: 1.3, lower: 0.9, upper: 1.7 }),
    ];
    expect(say({ branches }).second).toContain(
      ' Brekka put in clearly less than its norm, 81 % (79–83 %); Marrow put in clearly more than its norm, 108 % (104–112 %).',
    );
    expect(say({ branches: branches.slice(0, 2) }).second).toContain(
      ' Brekka put in clearly less than its norm, 81 % (79–83 %).',
    );
  });

  it('several branches at the norm, or with too few cars: none is named', () => {
    const branches = [
      productBranch('HAV', { ratioToNorm: 1, lower: 0.97, upper: 1.03 }),
      productBranch('BRE', { cars: 3, ratioToNorm: null, lower: null, upper: null }),
    ];
    expect(say({ branches }).second).toContain(' No branch lies clearly beside its norm.');
  });

  it('no cost known: nothing is said of it', () => {
    const overall = { ...productsAnswer().overall, costPerCarCents: null };
    expect(say({ overall }).first).toBe('94 % of the norm went in (92–96 %, 412 cars).');
  });

  it('no norm: says so, and who sets it', () => {
    const overall = noProducts().overall;
    const { first, second } = say({ jobs: 12, overall });
    expect(first).toBe('No norm is set for 12 cars of this time.');
    expect(second).toContain('head office');
  });

  it('few cars, no cars: why, and what to do', () => {
    const overall = { ...noProducts().overall, cars: 3 };
    expect(say({ jobs: 3, overall }).first).toBe('Too few cars yet: 3 cars with a norm.');
    const none = say(noProducts());
    expect(none.first).toBe('No car was finished in this time.');
    expect(none.second).toContain('Choose a longer time');
  });
});
