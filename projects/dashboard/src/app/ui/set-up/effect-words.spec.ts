import type { Effect, PlannedChange } from '#shared/contracts/set-up-help';
import { effectSentences, restatedWords } from './effect-words';

const RATE: PlannedChange = {
  kind: 'rate',
  branch: 'HAV',
  from: '2026-02-02',
  hourlyCostCents: 4_800,
};
const EFFECT: Effect = {
  jobs: 412,
  branches: 1,
  from: '2026-02-02',
  to: '2026-03-01',
  marginCents: { before: 4_120_000, after: 4_005_000 },
  figures: ['margin', 'expected_margin', 'bridge'],
};

describe('effectSentences', () => {
  it('a dated cost, with cars after its day, says how many, since when, what they keep and what moves', () => {
    expect(effectSentences(EFFECT, RATE, 'EUR').join(' ')).toBe(
      '412 cars of 1 branch from Feb 2, 2026 are computed anew. What they kept goes from €41,200 to €40,050. It moves margin, expected margin, and the bridge.',
    );
  });

  it('one car, whose margin stays, is one and stays', () => {
    const same = { ...EFFECT, jobs: 1, marginCents: { before: 100, after: 100 } };
    expect(effectSentences(same, RATE, 'EUR').slice(0, 2)).toEqual([
      '1 car of 1 branch from Feb 2, 2026 is computed anew.',
      'What they kept stays €1.',
    ]);
  });

  it('no car touched, says so and speaks of no money', () => {
    const none = { ...EFFECT, jobs: 0, branches: 0, from: null, figures: [] };
    expect(effectSentences(none, RATE, 'EUR')).toEqual(['No finished car is touched.']);
  });

  it('a warranty, says that what is sold keeps its own', () => {
    const change: PlannedChange = { kind: 'warranty', package: 'full', warrantyMonths: 60 };
    const effect: Effect = { ...EFFECT, jobs: 0, marginCents: null, figures: ['new_warranties'] };
    expect(effectSentences(effect, change, 'EUR')).toEqual([
      'Cars already sold keep the warranty they were sold with.',
      'It moves warranty of cars finished from now on.',
    ]);
  });

  it('a branch into another region, takes its history along', () => {
    const change: PlannedChange = { kind: 'branchRegion', branch: 'HAV', region: 'EA' };
    const effect: Effect = { ...EFFECT, marginCents: null, figures: ['region_comparison'] };
    expect(effectSentences(effect, change, 'EUR')[0]).toBe(
      '412 cars of the branch count in the new region, back to the first.',
    );
  });
});

describe('restatedWords', () => {
  it.each([
    [0, 'Saved.'],
    [1, 'Saved. 1 car computed anew.'],
    [1_200, 'Saved. 1,200 cars computed anew.'],
  ])('%d cars, says %s', (cars, words) => {
    expect(restatedWords(cars)).toBe(words);
  });
});
