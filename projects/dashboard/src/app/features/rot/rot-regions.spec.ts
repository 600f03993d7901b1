import { rotAnswer, rotRegion } from '../../testing/rot-answers';
import { regionColumns, regionRows } from './rot-region-table';
import { airWords, regionPicture } from './rot-regions';
import type { RotWords } from './rot-words';

const words: RotWords = { regionName: (code) => `Region ${code}`, bodyTypes: [] };
const plain = (text: string) => text.replaceAll('\u202f', ' ').replaceAll('\u00a0', ' ');

describe('airWords', () => {
  it.each([
    [{}, 'air C4, 62 µm a year'],
    [{ corrosionRateUmPerYear: 6.62, corrosivityCategory: 'C2' }, 'air C2, 6.6 µm a year'],
    [{ outsideFittedRange: true }, 'air C4, 62 µm a year, outside the fitted range'],
    [
      { corrosionRateUmPerYear: 812, corrosivityCategory: null, outsideFittedRange: true },
      'air beyond CX, 812 µm a year, outside the fitted range',
    ],
    [{ corrosionRateUmPerYear: null, corrosivityCategory: null }, 'no climate known'],
  ] as const)('a region with %j: %s', (more, said) => {
    expect(plain(airWords(rotRegion('OC', more)))).toBe(said);
  });
});

describe('regionPicture', () => {
  const picture = regionPicture(rotAnswer(), '10-14', words);

  it('ages with a car: rows, the chosen one marked, each with its reference', () => {
    expect(picture.rows.map(({ label, chosen }) => [label, chosen])).toEqual([
      ['5–9', false],
      ['10–14', true],
      ['15–19', false],
      ['20+', false],
    ]);
    expect(picture.references).toEqual([0.36, 0.36, 0.36, null]);
  });

  it('a region without a car of an age, and with too few: counts of 0 and 4, no share', () => {
    const [coast, inland] = picture.panels;
    expect(inland!.cells.map(({ count }) => count)).toEqual(['100', '100', '100', '0']);
    expect(coast!.cells[3]).toMatchObject({ cars: 4, share: null });
  });

  it('regions with different air: the harshest first', () => {
    expect(picture.panels.map(({ key }) => key)).toEqual(['OC', 'IH']);
  });

  it('ages left out of the adjusted share: named', () => {
    expect(picture.panels.map(({ adjustedNote }) => adjustedNote)).toEqual(['', 'without 20+']);
    expect(plain(`${picture.panels[0]!.adjusted} ${picture.panels[0]!.adjustedRange}`)).toBe(
      '33 % (27–40 %)',
    );
  });

  it('a region of the scope without any car: no panel', () => {
    const answer = rotAnswer();
    const regions = [...answer.regions, rotRegion('XX', { cars: 0 })];
    expect(regionPicture({ ...answer, regions }, '10-14', words).panels).toHaveLength(2);
  });

  it('reference is the scope: called so', () => {
    expect(regionPicture(rotAnswer({ reference: 'scope' }), '10-14', words).referenceWord).toBe(
      'all branches you see',
    );
  });
});

describe('regionRows', () => {
  it('each region: its ages, then its adjusted share, which the table tells apart', () => {
    const rows = regionRows(rotAnswer());
    expect(rows.map(({ region, age }) => `${region} ${age ?? 'adjusted'}`)).toEqual([
      ...['OC 5-9', 'OC 10-14', 'OC 20+', 'OC adjusted'],
      ...['IH 5-9', 'IH 10-14', 'IH 15-19', 'IH adjusted'],
    ]);
    const columns = regionColumns(rotAnswer(), words, () => undefined);
    const said = columns.map(({ text }) => plain(text(rows[7]!)));
    expect(said).toEqual(['Region IH', 'all, adjusted', '100', '30', '33 %', '27–40 %', '']);
  });
});
