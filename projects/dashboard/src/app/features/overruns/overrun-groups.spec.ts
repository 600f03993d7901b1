import { overrunAnswer, overrunGroup, smallGroup } from '../../testing/overrun-answers';
import { groupPictures } from './overrun-groups';
import type { OverrunWords } from './overrun-words';

const words: OverrunWords = { branchName: (c) => c, regionName: (c) => c, packageName: (c) => c };
const plain = (text: string): string => text.replaceAll('\u202f', ' ');
const groups = [
  overrunGroup('0-4', { ratio: 1.02, allowance: 0.1 }),
  overrunGroup('5-9', { ratio: 1.2 }),
  overrunGroup('15-19', { ratio: 1.48 }),
  smallGroup('20+'),
];
const pictures = groupPictures(overrunAnswer('ageBand', groups), 'ageBand', words, ({ key }) => ({
  commands: ['/jobs'],
  query: { ageBand: key },
}));

describe('groupPictures', () => {
  it('groups: compared with all cars, not with the estimate', () => {
    expect(pictures.ratios.reference).toBe(1.2);
    expect(pictures.ratios.rows.map(({ stand }) => stand)).toEqual([
      ...['below', 'as_expected', 'above', 'as_expected'],
    ]);
    expect(pictures.ratios.marks[0]).toMatchObject({ value: 1.2, text: 'all +20\u202f%' });
  });

  it('a group with too few cars: its count stays, its figures say why not', () => {
    expect(pictures.ratios.rows[3]).toMatchObject({
      count: '3',
      value: null,
      text: 'too few cars yet',
    });
    expect(pictures.spread.rows[3]).toMatchObject({ median: null, text: 'too few cars yet' });
  });

  it('the spread: named by its allowance', () => {
    expect(plain(pictures.spread.rows[0]!.text)).toBe('+10 %');
  });

  it('rows: each group leads to its cars, the total is the overall figure', () => {
    const column = pictures.columns[0]!;
    expect(column.link!(groups[0]!)).toEqual({ commands: ['/jobs'], query: { ageBand: '0-4' } });
    const totals = Object.fromEntries(
      pictures.columns.map(({ key, total }) => [key, plain(total ?? '')]),
    );
    expect(totals).toMatchObject({
      cars: '300',
      over: '+20 %',
      interval: '16–24 %',
      allowance: '+35 %',
    });
    expect(pictures.csv).toBe('CSV of these 4 rows');
  });
});
