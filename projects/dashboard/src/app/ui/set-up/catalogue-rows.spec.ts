import { currencyChoices, timeZoneChoices } from './choices';
import { costOfDay } from './dated-costs';
import { medianOffer } from './norm-changes';

describe('currencyChoices', () => {
  it('of all currencies, offers those counted in hundredths only', () => {
    const codes = currencyChoices().map(({ value }) => value);
    expect(codes).toEqual(expect.arrayContaining(['EUR', 'SEK', 'GBP']));
    expect(codes).not.toContain('JPY');
    expect(codes).not.toContain('KWD');
  });
});

describe('timeZoneChoices', () => {
  it('a zone in use that the browser does not list, stays', () => {
    expect(timeZoneChoices('Etc/Elsewhere')[0]?.value).toBe('Etc/Elsewhere');
    expect(timeZoneChoices('Europe/Lisbon')).toEqual(timeZoneChoices());
  });
});

describe('costOfDay', () => {
  const rows = [{ from: '2026-02-01' }, { from: null }, { from: '2026-03-01' }];

  it('a day between two, has the earlier', () => {
    expect(costOfDay(rows, '2026-02-02')).toBe(rows[0]);
  });

  it('a day before all dated ones, has the one from the start, or none where there is none', () => {
    expect(costOfDay(rows, '2020-01-01')).toBe(rows[1]);
    expect(costOfDay([{ from: '2026-02-01' }], '2026-01-31')).toBeUndefined();
  });
});

describe('medianOffer', () => {
  it('many cars, offers their median in whole ml and says between what most lay', () => {
    expect(
      medianOffer({ product: 'CW1', cars: 312, medianMl: 4100.5, p10Ml: 3200, p90Ml: 5000 }),
    ).toEqual({
      words: 'Median of 312 cars: 4.1\u202fL, eight of ten between 3.2\u202fL and 5.0\u202fL.',
      value: '4101',
    });
  });

  it('too few cars, says so and offers nothing', () => {
    const offer = medianOffer({
      product: 'CW1',
      cars: 3,
      medianMl: null,
      p10Ml: null,
      p90Ml: null,
    });
    expect(offer).toEqual({ words: '3 cars so far: too few to take a norm from.' });
  });
});
