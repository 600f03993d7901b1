import type { Field, FieldKind } from './field';
import { centsOrNull, codesOf, numberOf, shareOf, shareToType, wrongIn } from './read-field';

const field = (kind: FieldKind, more: Partial<Field> = {}): Field => ({
  key: 'x',
  label: 'Fee, %',
  kind,
  ...more,
});

describe('wrongIn', () => {
  it.each<[FieldKind, string]>([
    ['money', '48,50'],
    ['percent', '8.5 %'],
    ['decimal', '−3,2'],
    ['whole', '4200'],
    ['date', '2026-02-02'],
    ['code', 'HAV2'],
    ['packageCode', 'top_up'],
    ['newPassword', 'twelve chars'],
  ])('%s, written as people write it (%s), is right', (kind, text) => {
    expect(wrongIn(field(kind), { x: text })).toBeUndefined();
  });

  it.each<[FieldKind, string, string]>([
    ['money', '1,120', 'Write the amount as 48 or 48.50.'],
    ['percent', '101', 'Write it as 8 or 8.5, 0 to 100.'],
    ['percent', '8.12345', 'Write it as 8 or 8.5, 0 to 100.'],
    ['decimal', 'warm', 'Write a number as 9 or 9.5.'],
    ['whole', '4.2', 'Write a whole number, as 4200.'],
    ['date', '2026-02-30', 'Choose a day.'],
    ['code', 'hav', 'A code is 2 to 12 capital letters or digits.'],
    ['newPassword', 'too-short', 'At least 12 characters.'],
  ])('%s, written as %s, is told how to be written', (kind, text, message) => {
    expect(wrongIn(field(kind), { x: text })).toBe(message);
  });

  it('nothing typed, in a needed field, asks for it by its name; in an optional one, is right', () => {
    expect(wrongIn(field('text'), {})).toBe('Fee is needed.');
    expect(wrongIn(field('text', { need: 'optional' }), {})).toBeUndefined();
  });

  it('a code that is taken, in a form for a new row, is refused before it could overwrite', () => {
    expect(wrongIn(field('code', { taken: ['HAV'] }), { x: 'HAV' })).toMatch(/^HAV is taken/);
  });

  it('a field out of sight, whatever is in it, is right', () => {
    expect(wrongIn(field('text', { shownIf: () => false }), {})).toBeUndefined();
  });
});

describe('what is read', () => {
  it('per cent, typed, is the share that is typed back as the same', () => {
    expect(shareOf({ x: '8,25' }, 'x')).toBe(0.0825);
    expect(shareToType(0.0825)).toBe('8.25');
    expect(shareToType(null)).toBe('');
  });

  it('a decimal below zero, with either minus, is read', () => {
    expect(numberOf({ x: '-4.5' }, 'x')).toBe(-4.5);
    expect(numberOf({ x: '−4,5' }, 'x')).toBe(-4.5);
  });

  it('an amount left out, is null, not 0', () => {
    expect(centsOrNull({ x: '' }, 'x')).toBeNull();
    expect(centsOrNull({ x: '0' }, 'x')).toBe(0);
  });

  it('several choices, none or two, are a list of codes', () => {
    expect(codesOf({ x: '' }, 'x')).toEqual([]);
    expect(codesOf({ x: 'HAV KOR' }, 'x')).toEqual(['HAV', 'KOR']);
  });
});
