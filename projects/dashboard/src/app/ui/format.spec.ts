import * as format from './format';

const NARROW = '\u202f';

// jsdom's navigator prefers en-US; the formats checked here are those of any English unless said.
describe('format', () => {
  it('of shares puts a narrow space before % and rounds once', () => {
    expect(format.formatShare(0.364)).toBe(`36${NARROW}%`);
    expect(format.formatShare(0.364, 1)).toBe(`36.4${NARROW}%`);
    expect(format.formatShareRange(0.311, 0.458)).toBe(`31–46${NARROW}%`);
    expect(format.formatShareRange(-0.05, 0.458)).toBe(`−5 to 46${NARROW}%`);
  });

  it('of negative numbers writes the true minus, and none before a rounded zero', () => {
    expect(format.formatAmount(-29600)).toBe('−296');
    expect(format.formatAmount(-20)).toBe('0');
    expect(format.formatShare(-0.001)).toBe(`0${NARROW}%`);
    expect(format.formatMoney(-123456, 'EUR')).toBe('−€1,235');
    expect(format.formatMoney(-20, 'EUR')).toBe('€0');
  });

  it('of changes writes + as well, and nothing before zero', () => {
    expect(format.formatSignedExactAmount(37500)).toBe('+375.00');
    expect(format.formatSignedExactAmount(-73500)).toBe('−735.00');
    expect(format.formatSignedAmount(0)).toBe('0');
    expect(format.formatSignedMinutes(105)).toBe(`+1${NARROW}h 45${NARROW}min`);
    expect(format.formatSignedMinutes(0)).toBe(`0${NARROW}min`);
  });

  it('of money groups thousands and keeps the cents where asked', () => {
    expect(format.formatExactAmount(421834)).toBe('4,218.34');
    expect(format.formatMoney(179600, 'EUR')).toBe('€1,796');
    expect(format.formatExactMoney(179620, 'EUR')).toBe('€1,796.20');
    expect(format.currencySign('EUR')).toBe('€');
  });

  it.each([
    [0, `0${NARROW}min`],
    [45, `45${NARROW}min`],
    [60, `1${NARROW}h`],
    [105, `1${NARROW}h 45${NARROW}min`],
    [-105, `−1${NARROW}h 45${NARROW}min`],
    [75000, `1,250${NARROW}h`],
  ])('of %d minutes says hours and minutes', (minutes, words) => {
    expect(format.formatMinutes(minutes)).toBe(words);
  });

  it('of volumes changes to litres at a thousand millilitres', () => {
    expect(format.formatVolume(850)).toBe(`850${NARROW}ml`);
    expect(format.formatVolume(4200)).toBe(`4.2${NARROW}L`);
  });

  it('of weeks, dates and months spells them', () => {
    expect(format.formatWeek('2026-W05')).toBe('Week 5, 2026');
    expect(format.formatMonth('2026-01')).toBe('January 2026');
    expect(format.formatDate('2026-01-28')).toMatch(/^(28 January 2026|January 28, 2026)$/);
  });

  it('of dates never slips a day in a far time zone', () => {
    expect(format.formatDate('2026-01-01')).toMatch(/\b1\b/);
    expect(format.formatDate('2026-12-31')).toMatch(/\b31\b/);
  });

  it('of counts takes the noun in the right number', () => {
    expect(format.formatCars(1)).toBe('1 car');
    expect(format.formatCars(1120)).toBe('1,120 cars');
    expect(format.formatDays(19)).toBe('19 days');
  });
});

describe('preferredEnglish', () => {
  it('of languages takes the first English, whatever stands before it', () => {
    expect(format.preferredEnglish(['de-DE', 'en-IE', 'en-US'])).toBe('en-IE');
  });

  it('of languages without an English takes the British', () => {
    expect(format.preferredEnglish(['nb-NO'])).toBe('en-GB');
    expect(format.preferredEnglish([])).toBe('en-GB');
  });
});
