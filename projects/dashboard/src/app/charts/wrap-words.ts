import { textWidth } from './text-width';

/** Breaks a text into lines no wider than `width` px; a single word that is wider keeps a line of its own. */
export function wrapWords(text: string, width: number): readonly string[] {
  const lines: string[] = [];
  for (const word of text.split(' ').filter((one) => one !== '')) {
    const last = lines.at(-1);
    const longer = last === undefined ? word : `${last} ${word}`;
    if (last === undefined || textWidth(longer) > width) lines.push(word);
    else lines[lines.length - 1] = longer;
  }
  return lines;
}
