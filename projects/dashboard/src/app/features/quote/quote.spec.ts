import { quoteAnswer } from '../../testing/quote-answers';
import type { AnswerPart } from '../../ui/answer/answer';
import { chancePicture } from './chance-picture';
import { knownCars, modelsFor, usualPackage } from '../../core/catalogue/known-cars';
import { labourPicture } from './labour-picture';
import { noPriceWords } from './no-price';
import { priceLines, pricePicture } from './price-picture';
import { carsBehind, evidenceWords } from './quote-evidence';
import { marginToType, marginTyped, questionOf } from './quote-question';
import { refusalWords } from './refusal-words';
import { quoteSentences } from './quote-sentences';

const asked = {
  make: 'Velder',
  model: 'Tessock',
  firstRegistered: '2009-05',
  bodyType: 'hatchback',
  package: 'full',
  branch: 'HAV',
} as const;
const names = { branchName: (code: string) => code, productName: (code: string) => code };
const plain = (parts: readonly AnswerPart[]): string =>
  parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('')
    .replaceAll('\u202f', ' ');

describe('questionOf', () => {
  it('a whole question: taken, spaces at the edges cut', () => {
    expect(questionOf({ ...asked, make: ' Velder ', marginShare: '0.35' })).toEqual({
      ...asked,
      marginShare: 0.35,
    });
  });

  it('a part missing or senseless: no question; a senseless margin: the target', () => {
    expect(questionOf({ ...asked, firstRegistered: '2009' })).toBeUndefined();
    expect(questionOf({ ...asked, bodyType: 'boat' })).toBeUndefined();
    expect(questionOf({ ...asked, model: ' ' })).toBeUndefined();
    expect(questionOf({ ...asked, marginShare: '35' })).toEqual(asked);
  });
});

describe('marginTyped', () => {
  it('per cent as people type them: a share, and back', () => {
    expect(marginTyped('35')).toBe(0.35);
    expect(marginTyped('35,5 %')).toBe(0.355);
    expect(marginToType(0.355)).toBe('35.5');
    expect(marginToType(0.07)).toBe('7');
  });

  it('a hundred and more, or words: nothing', () => {
    expect(marginTyped('100')).toBeUndefined();
    expect(marginTyped('a third')).toBeUndefined();
  });
});

describe('evidenceWords', () => {
  it.each([
    ['model_age', 'branch', 'cars of this model and age at this branch'],
    ['body_age', 'branch', 'hatchbacks aged 15–19 years at this branch'],
    ['age', 'network', 'cars aged 15–19 years in the whole network, of any body type'],
    ['package', 'branch', 'cars with this package at this branch, of any age'],
  ] as const)('the set %s of the %s: named in plain words', (kind, source, words) => {
    expect(evidenceWords(quoteAnswer({ basis: { kind, source, cars: 41 } }), asked)).toBe(words);
  });
});

describe('carsBehind', () => {
  it('the branch’s own cars: three years of them, narrowed as the set is', () => {
    expect(carsBehind(quoteAnswer(), asked)).toEqual({
      branch: 'HAV',
      package: 'full',
      from: '2023-02-03',
      to: '2026-02-02',
      make: 'Velder',
      model: 'Tessock',
      ageBand: '15-19',
    });
    const basis = { kind: 'package', source: 'branch', cars: 99 } as const;
    expect(carsBehind(quoteAnswer({ basis }), asked)).not.toHaveProperty('ageBand');
  });

  it('the network’s cars: lead nowhere', () => {
    const basis = { kind: 'age', source: 'network', cars: 99 } as const;
    expect(carsBehind(quoteAnswer({ basis }), asked)).toBeNull();
  });
});

describe('quoteSentences', () => {
  it('a reader: labour, the cars behind it as a link, price with margin, target and fee', () => {
    const { sentence, second } = quoteSentences(quoteAnswer(), asked, 'EUR');
    expect(plain(sentence)).toBe(
      '7 h 20 min to 9 h 40 min of labour (half, and four of five, of such cars were done by then), from 41 cars of this model and age at this branch.',
    );
    expect(plain(second)).toBe(
      '€867.80 before tax would keep 35 %, the branch’s target, after the network fee of 6 %.',
    );
    expect(sentence.at(-2)).toMatchObject({ link: '/jobs' });
  });

  it('a recorder: the price alone', () => {
    const { second } = quoteSentences(quoteAnswer({ cost: undefined }), asked, 'EUR');
    expect(plain(second)).toBe('Price before tax: €867.80.');
  });

  it('a farther set: says why it stands in', () => {
    const basis = { kind: 'age', source: 'branch', cars: 60 } as const;
    expect(plain(quoteSentences(quoteAnswer({ basis }), asked, 'EUR').second)).toContain(
      'No nearer set has 30 cars',
    );
  });

  it('no set of 30 cars: says so and what to do', () => {
    const basis = { kind: 'none', source: null, cars: 0 } as const;
    const { sentence, second } = quoteSentences(quoteAnswer({ basis }), asked, 'EUR');
    expect(plain(sentence)).toBe('There are too few cars yet to quote from.');
    expect(plain(second)).toContain('Quote by hand');
  });
});

describe('noPriceWords', () => {
  const cost = quoteAnswer().cost;

  it('a price: nothing to say', () => {
    expect(noPriceWords(quoteAnswer(), names)).toBeUndefined();
  });

  it('no target: a reader writes a margin, a recorder asks for one', () => {
    expect(noPriceWords({ noPrice: 'no_target', cost }, names)).toContain('Write the margin');
    expect(noPriceWords({ noPrice: 'no_target', cost: undefined }, names)).toContain(
      'site manager can quote',
    );
  });

  it('a cost missing: names it and who fills it in', () => {
    const missingCosts = [{ kind: 'product', code: 'CW1' }];
    expect(noPriceWords({ noPrice: 'no_cost', cost: { ...cost!, missingCosts } }, names)).toBe(
      'A cost of today is missing: CW1. Head office fills it in.',
    );
  });

  it('a margin that leaves nothing: asks for less where it was asked for', () => {
    const asking = { ...cost!, marginFrom: 'asked' as const };
    expect(noPriceWords({ noPrice: 'target_too_high', cost: asking }, names)).toContain('less');
  });
});

describe('the pictures of a quote', () => {
  it('labour: every stage and the whole, which is no sum of them', () => {
    const { rows, data } = labourPicture(quoteAnswer());
    expect(rows).toHaveLength(8);
    expect(data.rows.at(-1)).toMatchObject({ key: 'all', value: 440, further: 580, chosen: true });
    expect(rows.slice(0, 7).reduce((sum, { p50 }) => sum + (p50 ?? 0), 0)).not.toBe(440);
  });

  it('chances: counted, with their intervals; too few say so', () => {
    const few = { worked: 3, holed: 1, share: null, lower: null, upper: null };
    const { data } = chancePicture(quoteAnswer({ openedUp: few }));
    expect(data.rows[0]).toMatchObject({ count: '26 of 41', value: 26 / 41 });
    expect(data.rows[1]).toMatchObject({ count: '1 of 3', value: null, text: 'too few yet' });
  });

  it('price: steps up to half kept, the wanted margin on the curve', () => {
    const picture = pricePicture(quoteAnswer(), 'EUR');
    expect(picture?.rows.at(-1)?.marginShare).toBe(0.5);
    expect(picture?.data.chosen).toMatchObject({ x: 0.35, y: 86_780 });
  });

  it('price for a recorder, or with a cost missing: no curve, no lines', () => {
    expect(pricePicture(quoteAnswer({ cost: undefined }), 'EUR')).toBeUndefined();
    expect(priceLines(quoteAnswer({ cost: undefined }))).toEqual([]);
    expect(priceLines(quoteAnswer({ priceCents: null }))).toEqual([]);
  });

  it('what the price is made of: adds up to it to the cent', () => {
    const lines = priceLines(quoteAnswer()).map(({ text }) => Number(text.replaceAll(',', '')));
    const sum = lines.slice(0, -1).reduce((total, amount) => total + Math.round(amount * 100), 0);
    expect(sum).toBe(Math.round(lines.at(-1)! * 100));
  });
});

describe('refusalWords', () => {
  it('a part that was refused: named as the form names it', () => {
    expect(refusalWords([{ path: '/query/model', message: 'at most 60 characters' }])).toBe(
      'Model: at most 60 characters.',
    );
    expect(refusalWords([{ path: '/query/marginShare', message: 'n' }])).toContain('Ask for less');
    expect(refusalWords([])).toContain('cannot be answered');
  });
});

describe('usualPackage', () => {
  it('jobs of several packages: the most frequent; of none: nothing', () => {
    const jobs = ['cavity', 'full', 'full'].map((code) => ({ package: code }));
    expect(usualPackage(jobs)).toBe('full');
    expect(usualPackage([])).toBeUndefined();
  });
});

describe('knownCars', () => {
  const car = (make: string, model: string) =>
    ({ vehicle: { make, model, bodyType: 'van', firstRegistered: '2010-01' } }) as const;

  it('jobs of several cars: each make and model once, by name', () => {
    const known = knownCars([car('Velder', 'Tarn'), car('Orsa', 'Brink'), car('Velder', 'Harrow')]);
    expect(known).toEqual([
      { make: 'Orsa', models: ['Brink'] },
      { make: 'Velder', models: ['Harrow', 'Tarn'] },
    ]);
    expect(modelsFor(known, ' velder ')).toEqual(['Harrow', 'Tarn']);
    expect(modelsFor(known, 'Hask')).toEqual(['Brink', 'Harrow', 'Tarn']);
  });
});
