import fc from 'fast-check';
import type { Digest } from '../features/digests/digest';
import { digestLetter } from './digest-letters';

const LINKS = {
  page: (path: string) => `https://desk.example${path}`,
  stop: 'https://desk.example/unsubscribe?token=a.b.c',
};
const TO = { email: 'a@network.example', name: 'Ansa' };
const DIGEST: Digest = {
  subject: 'Week 5, 2026: Havnsund',
  opening: 'Your week.',
  blocks: [
    {
      heading: 'Havnsund',
      sentences: ['Kept 38 %.', 'Ran over.'],
      lists: [{ title: 'New', items: ['A drift', 'A silence'] }],
      picture: {
        caption: 'Margin',
        columns: ['Week', 'Margin', 'Cars', ''],
        rows: [
          { cells: ['Week 4, 2026', '−5 %', '9 cars', ''], bar: null },
          { cells: ['Week 5, 2026', '38 %', '11 cars', 'below usual'], bar: 1 },
        ],
      },
      caution: 'Tell the owner.',
      path: '/this-week?week=2026-W05&branch=HAV',
      pathWords: 'See the week',
    },
  ],
};

/** What stands between the tags, and which tags there are. */
const tagsOf = (html: string): string[] => html.match(/<[^>]*>/g) ?? [];

describe('digestLetter', () => {
  it('given a digest, says in text what the markup says, in lines that stand under each other', () => {
    const { text } = digestLetter(TO, DIGEST, LINKS);
    expect(text).toContain('Hello Ansa,\n');
    expect(text).toContain('Kept 38 %.\nRan over.\n');
    expect(text).toContain(
      'Week 4, 2026    −5 %   9 cars\nWeek 5, 2026    38 %  11 cars  below usual\n',
    );
    expect(text).toContain('- A drift\n- A silence\n');
    expect(text).toContain('\nhttps://desk.example/this-week?week=2026-W05&branch=HAV\n');
    expect(text).toContain('\nhttps://desk.example/unsubscribe?token=a.b.c\n');
    expect(text).toContain('\nhttps://desk.example/account\n');
  });

  it('given a digest, draws bars that say nothing a number beside them does not, and no picture to fetch', () => {
    const { html } = digestLetter(TO, DIGEST, LINKS);
    expect(html.match(/aria-hidden="true"/g)).toHaveLength(1);
    expect(html).toContain('<th scope="row"');
    expect(html).toContain('>−5 %</td>');
    expect(html).toContain('<caption');
    expect(html).not.toMatch(/<img|<script|<link|src=|url\(/);
    expect(html).toContain('href="https://desk.example/this-week?week=2026-W05&amp;branch=HAV"');
  });

  it('given any names and notes, keeps the tags it had, one line each, and the headers theirs', () => {
    const { html } = digestLetter(TO, DIGEST, LINKS);
    const wild = fc.oneof(
      fc.string({ unit: 'binary' }),
      fc.constantFrom(
        'a\r\nBcc: all@network.example',
        '</td><script>',
        '"><img src=x>',
        '\u2028x\u202e',
      ),
    );
    fc.assert(
      fc.property(wild, wild, wild, (name, branch, note) => {
        const [block] = DIGEST.blocks;
        const letter = digestLetter(
          { ...TO, name },
          {
            subject: `Week 5: ${branch}`,
            opening: DIGEST.opening,
            blocks: [
              {
                ...block!,
                heading: branch,
                sentences: [note, branch],
                lists: [{ title: 'New', items: [note, branch] }],
              },
            ],
          },
          LINKS,
        );
        expect(letter.subject).not.toMatch(/[\p{Cc}\p{Zl}\p{Zp}\u202e]/u);
        expect(letter.text).not.toMatch(/[\r\u2028\u2029\u202e]/);
        expect(letter.text.split('\n')).toHaveLength(
          digestLetter(TO, DIGEST, LINKS).text.split('\n').length,
        );
        expect(tagsOf(letter.html)).toEqual(tagsOf(html));
      }),
    );
  });
});
