import { formatDate, formatList } from '../../ui/format';
import {
  countAtStart,
  missingCostWords,
  ordinal,
  points,
  pValue,
  whoseUsual,
  type WeekWords,
} from './week-words';

describe('pValue', () => {
  it.each([
    [0.7, 'p = 0.7'],
    [0.0996, 'p = 0.1'],
    [0.034, 'p = 0.03'],
    [0.0042, 'p = 0.004'],
    [0.00001, 'p < 0.001'],
  ])('%d: %s', (p, said) => expect(pValue(p)).toBe(said));
});

describe('ordinal', () => {
  it.each([
    [8, '8th'],
    [11, '11th'],
    [21, '21st'],
    [22, '22nd'],
    [23, '23rd'],
    [112, '112th'],
  ])('%d: %s', (count, said) => expect(ordinal(count)).toBe(said));
});

describe('countAtStart', () => {
  it('up to twelve in words, then in figures', () => {
    expect([1, 12, 13, 1200].map(countAtStart)).toEqual(['One', 'Twelve', '13', '1,200']);
  });
});

describe('points', () => {
  it('whole points of either sign, one in the singular', () => {
    expect([-0.082, 0.011, 0.004].map(points)).toEqual(['8 points', '1 point', '0 points']);
  });
});

describe('whoseUsual', () => {
  const one = { regions: ['OC'], branches: ['HAV'] };
  const two = { regions: ['OC'], branches: ['HAV', 'OST'] };
  const wide = { regions: ['OC', 'IN'], branches: ['HAV', 'OST', 'BRE'] };
  const chose = (branches: boolean, regions: boolean) => ({
    choseBranches: branches,
    choseRegions: regions,
  });

  it.each([
    ['one branch', one, 'head_office', chose(true, false), 'this branch’s'],
    ['two branches of a manager', two, 'site_manager', chose(false, false), 'these branches’'],
    ['a lead’s region', two, 'regional_lead', chose(false, false), 'this region’s'],
    ['two branches a lead chose', two, 'regional_lead', chose(true, false), 'these branches’'],
    ['a lead’s two regions', wide, 'regional_lead', chose(false, false), 'these regions’'],
    ['the network', wide, 'head_office', chose(false, false), 'the network’s'],
    ['two regions head office chose', wide, 'head_office', chose(false, true), 'these regions’'],
  ] as const)('%s: said so', (_, scope, role, choice, said) => {
    const echo = { regions: [...scope.regions], branches: [...scope.branches] };
    expect(whoseUsual(echo, { role, ...choice })).toBe(said);
  });
});

describe('missingCostWords', () => {
  const words: WeekWords = {
    currency: 'EUR',
    today: '2026-02-02',
    branchName: () => 'Havnsund',
    packageName: (code) => code,
    productName: () => 'Thin wax',
    whose: '',
  };
  const on = '2026-01-28';

  it('each kind: named with its day', () => {
    expect(missingCostWords([{ kind: 'fee', code: 'network', on }], words)).toBe(
      `the network fee from ${formatDate(on)}`,
    );
    expect(missingCostWords([{ kind: 'consumable', code: 'trim_clip', on }], words)).toBe(
      `the cost of trim clips from ${formatDate(on)}`,
    );
  });

  it('more than two: two named, the rest counted', () => {
    const missing = [
      { kind: 'hourlyCost', code: 'HAV', on },
      { kind: 'product', code: 'CW1', on },
      { kind: 'product', code: 'CW2', on },
      { kind: 'product', code: 'CW3', on },
    ] as const;
    expect(missingCostWords(missing, words)).toBe(
      formatList([
        `the hourly cost of Havnsund from ${formatDate(on)}`,
        `the cost of Thin wax from ${formatDate(on)}`,
        '2 more',
      ]),
    );
  });
});
