import type { Digest, DigestBlock, DigestPicture, DigestRow } from '../features/digests/digest';
import type { Addressee, Mail } from './letters';
import { escaped, oneLine } from './plain-line';

/** Where the links of a digest lead. */
export interface DigestLinks {
  /** Address of a page by its path. */
  page: (path: string) => string;
  /** The signed link that stops this kind of mail. */
  stop: string;
}

const STOP = 'Stop this mail:';
const CHOOSE = 'Which mails you receive is said on your own page:';

/**
 * A digest as a mail: HTML whose tables read without pictures and without colour, and a text that says the same in aligned
 * lines. Names and notes come from people, so every one of them is made one plain line, and escaped where it is markup.
 */
export function digestLetter(to: Addressee, digest: Digest, links: DigestLinks): Mail {
  return {
    to: to.email,
    subject: oneLine(digest.subject),
    text: textOf(to, digest, links),
    html: htmlOf(to, digest, links),
  };
}

function textOf(to: Addressee, { opening, blocks }: Digest, { page, stop }: DigestLinks): string {
  return [
    `Hello ${oneLine(to.name)},`,
    oneLine(opening),
    ...blocks.flatMap((block) => textOfBlock(block, page)),
    `${STOP}\n${stop}`,
    `${CHOOSE}\n${page('/account')}`,
  ]
    .join('\n\n')
    .concat('\n');
}

function textOfBlock(block: DigestBlock, page: DigestLinks['page']): string[] {
  const heading = oneLine(block.heading);
  return [
    `${heading}\n${'-'.repeat(Math.min([...heading].length, 60))}`,
    block.sentences.map(oneLine).join('\n'),
    ...(block.caution === null ? [] : [oneLine(block.caution)]),
    ...(block.picture ? [textOfPicture(block.picture)] : []),
    ...block.lists.map(({ title, items }) =>
      [`${oneLine(title)}:`, ...items.map((item) => `- ${oneLine(item)}`)].join('\n'),
    ),
    `${oneLine(block.pathWords)}:\n${page(block.path)}`,
  ];
}

/** Lines whose columns stand under each other: names to the left, figures to the right. */
function textOfPicture({ caption, columns, rows }: DigestPicture): string {
  const lines = [columns, ...rows.map(({ cells }) => cells)].map((cells) => cells.map(oneLine));
  const widths = columns.map((_column, at) =>
    Math.max(...lines.map((cells) => [...(cells[at] ?? '')].length)),
  );
  const told = lines.map((cells) =>
    cells
      .map((cell, at) => {
        const space = ' '.repeat((widths[at] ?? 0) - [...cell].length);
        return isFigure(at) ? space + cell : cell + space;
      })
      .join('  ')
      .trimEnd(),
  );
  return [`${oneLine(caption)}:`, ...told].join('\n');
}

const FONT = "font-family:'Work Sans',Arial,sans-serif;font-size:16px;line-height:24px";
const CELL = 'padding:4px 16px 4px 0;border-bottom:1px solid #d9d4c8;text-align:';
const LONGEST_BAR = 120;

function htmlOf(to: Addressee, digest: Digest, { page, stop }: DigestLinks): string {
  const title = escaped(oneLine(digest.subject));
  const body = [
    paragraph(`Hello ${to.name},`),
    paragraph(digest.opening),
    ...digest.blocks.map((block) => htmlOfBlock(block, page)),
    `<p>${STOP} ${link(stop, 'stop it with one click')}.<br>${CHOOSE} ${link(page('/account'), 'Account')}.</p>`,
  ].join('\n');
  return `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>${title}</title></head>\n<body style="${FONT}">\n${body}\n</body></html>`;
}

function htmlOfBlock(block: DigestBlock, page: DigestLinks['page']): string {
  return [
    `<h2 style="font-size:20px;line-height:28px">${escaped(oneLine(block.heading))}</h2>`,
    ...block.sentences.map(paragraph),
    ...(block.caution === null
      ? []
      : [`<p><strong>${escaped(oneLine(block.caution))}</strong></p>`]),
    ...(block.picture ? [htmlOfPicture(block.picture)] : []),
    ...block.lists.map(
      ({ title, items }) =>
        `<h3 style="font-size:16px">${escaped(oneLine(title))}</h3>\n<ul>${items.map((item) => `<li>${escaped(oneLine(item))}</li>`).join('\n')}</ul>`,
    ),
    `<p>${link(page(block.path), block.pathWords)}</p>`,
  ].join('\n');
}

function htmlOfPicture({ caption, columns, rows }: DigestPicture): string {
  const drawn = rows.some(({ bar }) => bar !== null);
  const heads = columns.map(
    (column, at) => `<th scope="col" style="${CELL}${side(at)}">${escaped(oneLine(column))}</th>`,
  );
  // The bars have a column of their own, which says nothing that the figure before it does not.
  if (drawn) heads.splice(2, 0, `<td style="${CELL}left"></td>`);
  return [
    '<table style="border-collapse:collapse">',
    `<caption style="text-align:left;padding:8px 0">${escaped(oneLine(caption))}</caption>`,
    `<thead><tr>${heads.join('')}</tr></thead>`,
    `<tbody>${rows.map((row) => htmlOfRow(row, drawn)).join('\n')}</tbody>`,
    '</table>',
  ].join('\n');
}

function htmlOfRow({ cells, bar }: DigestRow, drawn: boolean): string {
  const told = cells.map((cell, at) => {
    const text = escaped(oneLine(cell));
    return at === 0
      ? `<th scope="row" style="${CELL}left;font-weight:400">${text}</th>`
      : `<td style="${CELL}${side(at)}">${text}</td>`;
  });
  if (drawn) told.splice(2, 0, `<td style="${CELL}left">${barOf(bar)}</td>`);
  return `<tr>${told.join('')}</tr>`;
}

/** A cell as wide as its figure: drawn by the table itself, because mail programs hold pictures back. */
function barOf(bar: number | null): string {
  if (bar === null) return '';
  const width = Math.max(1, Math.round(Math.min(bar, 1) * LONGEST_BAR));
  return `<div aria-hidden="true" style="width:${width}px;height:12px;background:#8c3a22;border:1px solid #1e2a2f"></div>`;
}

function paragraph(text: string): string {
  return `<p>${escaped(oneLine(text))}</p>`;
}

function link(address: string, words: string): string {
  return `<a href="${escaped(address)}">${escaped(oneLine(words))}</a>`;
}

function side(column: number): 'left' | 'right' {
  return isFigure(column) ? 'right' : 'left';
}

/** The first column names, those after it are figures, the fourth says words. */
function isFigure(column: number): boolean {
  return column === 1 || column === 2;
}
