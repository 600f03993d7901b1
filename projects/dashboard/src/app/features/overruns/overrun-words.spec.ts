import {
  groupName,
  intervalText,
  noFigureText,
  type OverrunWords,
  ratioText,
} from './overrun-words';

const plain = (text: string): string => text.replaceAll('\u202f', ' ');
const words: OverrunWords = {
  branchName: () => 'Havnsund',
  regionName: () => 'Outer Coast',
  packageName: () => 'Full',
};

describe('ratioText', () => {
  it.each([
    [1.234, '+23 %'],
    [1, '0 %'],
    [0.92, '−8 %'],
    [2.99, '+199 %'],
    [11.81, '11.8 times'],
  ])('a ratio of %d: %s', (ratio, said) => expect(plain(ratioText(ratio))).toBe(said));
});

describe('intervalText', () => {
  it('the ratio estimator’s 95 %: ratio ± 1.959964 s.e. as the part added (rule 26)', () => {
    expect(plain(intervalText(1.23, 0.02))).toBe('19–27 %');
    expect(plain(intervalText(1.01, 0.02))).toBe('−3 to 5 %');
  });

  it('a multiple: in times, never below none', () => {
    expect(intervalText(11.8, 1.6)).toBe('8.7–14.9 times');
    expect(intervalText(4, 3)).toBe('0.0–9.9 times');
  });
});

describe('noFigureText', () => {
  it('too few cars, but a stage that no estimate names says so', () => {
    expect(noFigureText(1200, 3)).toBe('too few cars yet');
    expect(noFigureText(0, 3)).toBe('too few cars yet');
    expect(noFigureText(0, 300)).toBe('never estimated');
  });
});

describe('groupName', () => {
  it.each([
    ['stage', 'strip', 'strip'],
    ['branch', 'HAV', 'Havnsund'],
    ['region', 'OC', 'Outer Coast'],
    ['package', 'full', 'full'],
    ['bodyType', 'pickup', 'pick-up'],
    ['month', '2026-01', 'January 2026'],
    ['ageBand', '10-14', '10–14 years'],
    ['ageBand', '20+', '20 years and over'],
    ['rotFound', 'found', 'rot found'],
    ['rotFound', 'not_found', 'no rot found'],
  ] as const)('%s %s: %s', (by, key, name) => expect(groupName(by, key, words)).toBe(name));
});
