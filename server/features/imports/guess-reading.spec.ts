import { importFields } from '#shared/domain/import-fields';
import { guessReading, headRows } from './guess-reading';

const FIELDS = importFields('jobs', {
  products: [{ code: 'CW1', name: 'Wax' }],
  packages: [{ code: 'full', name: 'Full' }],
});
const guess = (text: string, encoding: 'utf-8' | 'windows-1252' = 'utf-8'): Promise<object> =>
  guessReading({ head: Buffer.from(text), whole: true, sha256: '', encoding }, FIELDS);

describe('The reading of a file', () => {
  it.each([
    ['commas', 'job,price\nA,1.50\n', { delimiter: ',', decimal: '.' }],
    [
      'semicolons with decimal commas',
      'job;price\nA;1,50\nB;1.500,00\n',
      { delimiter: ';', decimal: ',' },
    ],
    ['semicolons with decimal points', 'job;price\nA;1.50\n', { delimiter: ';', decimal: '.' }],
    [
      'semicolons and nothing to tell the decimal by',
      'job;price\nA;1\n',
      { delimiter: ';', decimal: ',' },
    ],
    ['tabs', 'job\tprice\tnotes\nA\t1,50\ta,b;c\n', { delimiter: '\t', decimal: ',' }],
    ['bars', 'job|notes\nA|x,y,z\n', { delimiter: '|' }],
    ['delimiters inside quotes', 'job;notes\nA;"x,y"\nB;"p,q,r"\n', { delimiter: ';' }],
    ['years first', 'job,completed\nA,2026-01-28\n', { dateOrder: 'ymd' }],
    ['days that may be months', 'job,completed\nA,01.02.2026\n', { dateOrder: 'dmy' }],
    [
      'a day that can be no month',
      'job,completed\nA,01/02/2026\nB,28/01/2026\n',
      { dateOrder: 'dmy' },
    ],
    [
      'a second part that can be no month',
      'job,completed\nA,01/02/2026\nB,01/28/2026\n',
      { dateOrder: 'mdy' },
    ],
    [
      'both ways of writing',
      'job,completed\nA,2026-01-28\nB,2026-01-28\nC,1/28/2026\n',
      { dateOrder: 'mdy' },
    ],
    ['no headings that are known', 'a;b\nx;1,5\n', { delimiter: ';', decimal: ',' }],
    ['one column', 'job\nA\n', { delimiter: ',' }],
  ])('given %s, is guessed so', async (_, text, expected) => {
    expect(await guess(text)).toMatchObject(expected);
  });

  it('given a beginning that is cut in a row, leaves that row out', async () => {
    const head = Buffer.from('a,b\n1,2\n3,"4');
    expect(await headRows({ head, whole: false, encoding: 'utf-8' }, ',')).toEqual([
      ['a', 'b'],
      ['1', '2'],
    ]);
  });
});
