import type { Lettering, Paper } from './paper';

/** A text cut to a width, with three dots where it was cut. */
export function shortened(paper: Paper, text: string, width: number, lettering: Lettering): string {
  if (paper.widthOf(text, lettering) <= width) return text;
  const characters = [...text];
  while (characters.length > 1) {
    characters.pop();
    const cut = `${characters.join('').trimEnd()}…`;
    if (paper.widthOf(cut, lettering) <= width) return cut;
  }
  return text.slice(0, 1);
}
