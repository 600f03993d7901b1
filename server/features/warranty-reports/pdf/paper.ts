import PDFDocument from 'pdfkit';
import { COLOURS } from './colours';
import { Fonts, type Weight } from './fonts';

/** How a text is set. */
export interface Lettering {
  size: number;
  weight?: Weight;
  colour?: string;
  /** Which end of the text stands at its x. */
  align?: 'left' | 'right' | 'centre';
}

/** How a page lies. */
export type Lie = 'portrait' | 'landscape';

/** What a report is called and of which day it is: all that goes into the file beside its pages. */
export interface Imprint {
  title: string;
  /** `2026-02-01`; the file says it was made then, so that it is the same whenever it is made. */
  day: string;
}

const MARGIN = { side: 48, top: 48, foot: 56 };
/** Figures that stand in columns are of one width. */
const FEATURES: PDFKit.Mixins.OpenTypeFeatures[] = ['tnum'];

/** Sheets of A4 that are written from top to bottom, every piece of them tagged for those who listen to it. */
export class Paper {
  readonly doc: PDFKit.PDFDocument;
  readonly fonts: Fonts;
  /** Where the next block begins. */
  y = MARGIN.top;
  readonly left = MARGIN.side;
  /** Left in the foot of every page. */
  foot = '';
  private lie: Lie = 'portrait';
  private readonly root: PDFKit.PDFStructureElement;

  constructor(imprint: Imprint) {
    const made = new Date(`${imprint.day}T00:00:00Z`);
    const named = { Title: imprint.title, Creator: 'Underseam', Producer: 'Underseam' };
    this.doc = new PDFDocument({
      size: 'A4',
      margin: 0,
      pdfVersion: '1.7',
      tagged: true,
      lang: 'en-GB',
      displayTitle: true,
      bufferPages: true,
      font: '',
      info: { ...named, CreationDate: made, ModDate: made },
    });
    this.fonts = new Fonts(this.doc);
    this.root = this.doc.struct('Document');
    this.doc.addStructure(this.root);
  }

  get right(): number {
    return this.doc.page.width - MARGIN.side;
  }

  get width(): number {
    return this.right - this.left;
  }

  /** The lowest place that a block may reach. */
  get bottom(): number {
    return this.doc.page.height - MARGIN.foot;
  }

  /** Begins a page. */
  turn(lie: Lie = this.lie): void {
    this.lie = lie;
    this.doc.addPage({ size: 'A4', layout: lie, margin: 0 });
    this.y = MARGIN.top;
  }

  /** Begins a page when a block of that height does not fit any more; tells whether it did. */
  room(height: number): boolean {
    if (this.y + height <= this.bottom) return false;
    this.turn();
    return true;
  }

  /** A piece of the document as readers of its structure find it: `H2`, `P`, `Figure` with what it shows, in words. */
  tagged(
    type: string,
    draw: () => void,
    told: { alt?: string; parent?: PDFKit.PDFStructureElement } = {},
  ) {
    const element = this.doc.struct(type, told.alt === undefined ? {} : { alt: told.alt });
    (told.parent ?? this.root).add(element);
    element.add(draw);
    element.end();
  }

  /** A part that holds others: a table, a row. End it when they are in. */
  part(type: string, parent: PDFKit.PDFStructureElement = this.root): PDFKit.PDFStructureElement {
    const element = this.doc.struct(type);
    parent.add(element);
    return element;
  }

  /** Lines and grounds that say nothing of their own. */
  artifact(draw: () => void): void {
    this.doc.markContent('Artifact');
    draw();
    this.doc.endMarkedContent();
  }

  /** How wide a text is. */
  widthOf(text: string, { size, weight = 400 }: Lettering): number {
    return this.fonts.runs(text, weight).reduce((sum, run) => {
      this.doc.font(run.font).fontSize(size);
      return sum + this.doc.widthOfString(run.text, { features: FEATURES });
    }, 0);
  }

  /** One line of text on its baseline. */
  text(text: string, x: number, baseline: number, lettering: Lettering): void {
    const { size, weight = 400, colour = COLOURS.ink, align = 'left' } = lettering;
    const width = align === 'left' ? 0 : this.widthOf(text, lettering);
    let at = x - (align === 'right' ? width : align === 'centre' ? width / 2 : 0);
    for (const run of this.fonts.runs(text, weight)) {
      const options = { features: FEATURES, lineBreak: false, baseline: 'alphabetic' } as const;
      this.doc
        .font(run.font)
        .fontSize(size)
        .fillColor(colour)
        .text(run.text, at, baseline, options);
      at += this.doc.widthOfString(run.text, { features: FEATURES });
    }
  }

  /** A straight line. */
  rule(fromX: number, fromY: number, toX: number, toY: number, colour: string, wide = 0.5): void {
    this.doc.lineWidth(wide).undash().moveTo(fromX, fromY).lineTo(toX, toY).stroke(colour);
  }

  /** The finished file: every page says of which day the report is, and which page it is of how many. */
  finish(): Buffer {
    const { start, count } = this.doc.bufferedPageRange();
    for (let index = 0; index < count; index += 1) {
      this.doc.switchToPage(start + index);
      this.artifact(() => this.footOf(index + 1, count));
    }
    this.root.end();
    this.doc.end();
    // Nothing is read while pages are drawn, so that the whole file waits in the stream.
    const file = this.doc.read() as Buffer | null;
    if (file?.subarray(-6).toString().trim() !== '%%EOF') throw new Error('the file is cut short');
    return file;
  }

  private footOf(page: number, pages: number): void {
    const y = this.doc.page.height - 36;
    this.rule(this.left, y, this.right, y, COLOURS.hairline);
    const quiet = { size: 8, colour: COLOURS.quiet };
    this.text(this.foot, this.left, y + 13, quiet);
    this.text(`page ${page} of ${pages}`, this.right, y + 13, { ...quiet, align: 'right' });
  }
}
