import type { Lettering, Paper } from './paper';

/** A piece of a paragraph in a lettering of its own. */
export type Span = Lettering & { text: string };

/** Lines of words from left to right, broken at spaces; the height of a line is that of its largest lettering. */
export function paragraph(paper: Paper, spans: readonly Span[], type = 'P', leading = 1.4): void {
  const lines = linesOf(paper, spans, paper.width);
  const heights = lines.map((line) => leading * Math.max(...line.map(({ size }) => size)));
  paper.room(heights.reduce((sum, height) => sum + height, 0));
  paper.tagged(type, () => {
    lines.forEach((line, index) => {
      paper.y += heights[index] ?? 0;
      let x = paper.left;
      for (const span of line) {
        paper.text(span.text, x, paper.y - 0.28 * (heights[index] ?? 0), span);
        x += paper.widthOf(span.text, span);
      }
    });
  });
}

/** How words fall into lines of a width; a word that is wider than a line has one of its own. */
export function linesOf(paper: Paper, spans: readonly Span[], width: number): Span[][] {
  const lines: Span[][] = [[]];
  let used = 0;
  for (const span of spans) {
    for (const word of span.text.split(/(?<= )/)) {
      const wide = paper.widthOf(word.trimEnd(), span);
      if (used > 0 && used + wide > width) {
        lines.push([]);
        used = 0;
      }
      const line = lines.at(-1);
      const last = line?.at(-1);
      if (last && last.size === span.size && last.weight === span.weight) {
        if (last.colour === span.colour) last.text += word;
        else line?.push({ ...span, text: word });
      } else line?.push({ ...span, text: word });
      used += paper.widthOf(word, span);
    }
  }
  return lines;
}
