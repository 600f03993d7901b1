/** Weights of Work Sans that the report is set in. */
export type Weight = 400 | 500 | 600;

/** The part of pdfkit that is not in its types: the font program that was opened, asked which characters it holds. */
interface OpenedFont {
  font: { hasGlyphForCodePoint(codePoint: number): boolean };
}

const SUBSETS = ['latin', 'latin-ext'] as const;
const WEIGHTS: readonly Weight[] = [400, 500, 600];

/** A piece of text that one font file can draw. */
export interface Run {
  font: string;
  text: string;
}

/** The product's typeface, which comes in files of some characters each: knows which file draws which. */
export class Fonts {
  private readonly programs = new Map<string, OpenedFont['font']>();

  constructor(doc: PDFKit.PDFDocument) {
    for (const subset of SUBSETS) {
      for (const weight of WEIGHTS) {
        const name = `${subset} ${weight}`;
        const file = `@fontsource/work-sans/files/work-sans-${subset}-${weight}-normal.woff`;
        doc.registerFont(name, require.resolve(file));
        doc.font(name);
        this.programs.set(name, (doc as unknown as { _font: OpenedFont })._font.font);
      }
    }
  }

  /** Text cut into pieces of one font file each; what no file can draw is left out. */
  runs(text: string, weight: Weight): Run[] {
    const runs: Run[] = [];
    for (const character of text) {
      const font = this.fontOf(character, weight, runs.at(-1)?.font);
      if (font === undefined) continue;
      const last = runs.at(-1);
      if (last?.font === font) last.text += character;
      else runs.push({ font, text: character });
    }
    return runs;
  }

  /** Whether every character can be drawn: nothing may print as a box. */
  canDraw(text: string): boolean {
    return [...text].every((character) => this.fontOf(character, 400) !== undefined);
  }

  /** The file that draws a character, rather the one in use: a space then does not cut a word off. */
  private fontOf(character: string, weight: Weight, inUse?: string): string | undefined {
    const codePoint = character.codePointAt(0) ?? 0;
    const names = SUBSETS.map((subset) => `${subset} ${weight}`);
    const inOrder = inUse === undefined ? names : [inUse, ...names];
    return inOrder.find((name) => this.programs.get(name)?.hasGlyphForCodePoint(codePoint));
  }
}
