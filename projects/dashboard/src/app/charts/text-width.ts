/**
 * Advance widths of Work Sans at weight 400 in thousandths of the font size, figures tabular. Measured from the shipped font;
 * they let a layout place labels without asking the DOM, so that it stays a pure function.
 */
const ADVANCES: readonly (readonly [number, string])[] = [
  [155, '\u202f\u2009'],
  [235, "'·|"],
  [275, 'ij/'],
  [300, ' .,:;lI\u00a0'],
  [335, '()'],
  [365, 't'],
  [400, 'fr'],
  [515, 'y-v'],
  [535, 'gsxz'],
  [570, 'aekcJ'],
  [604, '0123456789−+€$£oTLXYFP'],
  [625, 'bdpqhnuZES'],
  [665, 'ABKRV–'],
  [720, 'CDGHNU'],
  [750, 'OQ'],
  [840, 'wM'],
  [870, '%'],
  [955, 'mW'],
];

const ADVANCE_OF = new Map(
  ADVANCES.flatMap(([advance, letters]) => [...letters].map((letter) => [letter, advance])),
);
const ADVANCE_OF_OTHERS = 640;
/** Weight 600 runs a little wider. */
const SEMIBOLD = 1.025;

/** Width in CSS px of one line of Work Sans, at 14 px unless told; `weight` 600 is the heavier cut. */
export function textWidth(text: string, weight: 400 | 600 = 400, fontSize = 14): number {
  let thousandths = 0;
  for (const letter of text) thousandths += ADVANCE_OF.get(letter) ?? ADVANCE_OF_OTHERS;
  return (thousandths / 1000) * fontSize * (weight === 600 ? SEMIBOLD : 1);
}

/** The widest of several lines, 0 for none. */
export function widestText(texts: readonly string[], weight: 400 | 600 = 400): number {
  return texts.reduce((widest, text) => Math.max(widest, textWidth(text, weight)), 0);
}

/** Width of the words that stand on the hatching of a row with too few cars. */
export function hatchWords(text: string): number {
  return textWidth(text) + 12;
}
