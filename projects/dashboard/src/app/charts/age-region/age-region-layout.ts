import { textWidth, widestText } from '../text-width';
import { wrapWords } from '../wrap-words';
import type { AgeRegionCell, AgeRegionInput, RegionPanel } from './age-region-input';

/** A share with its interval, in px of the picture. */
export interface PlacedShare {
  readonly x: number;
  readonly from: number;
  readonly to: number;
}

/** One age of one region. */
export interface PlacedCell {
  readonly key: string;
  readonly y: number;
  readonly count: string;
  readonly chosen: boolean;
  /** `none`: not one car, nothing is drawn. */
  readonly kind: 'share' | 'few' | 'none';
  readonly share: PlacedShare | null;
  readonly reference: number | null;
}

/** One region with everything that is drawn of it. */
export interface PlacedPanel {
  readonly key: string;
  readonly name: string;
  readonly air: readonly string[];
  readonly left: number;
  readonly plotRight: number;
  readonly countX: number;
  readonly top: number;
  readonly ticks: readonly { readonly x: number; readonly text: string }[];
  readonly cells: readonly PlacedCell[];
  readonly adjusted: string;
  readonly adjustedRange: string;
  readonly adjustedNote: readonly string[];
}

/** A line of regions: names, rows with their ages, axis, adjusted shares. Heights are of the whole picture. */
export interface PanelLine {
  readonly top: number;
  readonly headY: number;
  readonly rowsTop: number;
  readonly rowsBottom: number;
  readonly ticksY: number;
  readonly adjustedY: number;
  readonly ages: readonly {
    readonly label: string;
    readonly y: number;
    readonly chosen: boolean;
  }[];
  readonly strip: { readonly y: number; readonly height: number } | null;
  readonly panels: readonly PlacedPanel[];
}

/** Everything the chart draws, in px. */
export interface AgeRegionLayout {
  readonly width: number;
  readonly height: number;
  readonly labelX: number;
  readonly lines: readonly PanelLine[];
}

const ROW = 31;
const TEXT = 20;
const LABEL_X = 8;
const LEAST_PANEL = 112;
/** Narrower than this, as on a phone, each region has the whole width. */
const SIDE_BY_SIDE = 480;
const MOST_PANEL = 500;
const BETWEEN = 16;
const BETWEEN_LINES = 28;
/** Where no interval reaches further the axis ends at a half. */
const HALF = 0.5;

/** Lays regions side by side, as many as fit in a line, under one another on a phone. Pure. */
export function layOutAgeRegion(input: AgeRegionInput, width: number): AgeRegionLayout {
  const labels = LABEL_X + widestText(['adjusted', ...input.rows.map(({ label }) => label)]) + 14;
  const room = width - labels;
  const fitting =
    width < SIDE_BY_SIDE ? 1 : Math.max(1, Math.floor((room + BETWEEN) / (LEAST_PANEL + BETWEEN)));
  const perLine = evenly(input.panels.length, fitting);
  const panelWidth = Math.min(MOST_PANEL, Math.floor((room - (perLine - 1) * BETWEEN) / perLine));
  const end = axisEnd(input);
  const lines: PanelLine[] = [];
  let top = 0;
  for (let first = 0; first < input.panels.length; first += perLine) {
    const panels = input.panels.slice(first, first + perLine);
    const line = layOutLine(input, panels, { top, labels, panelWidth, end });
    lines.push(line);
    top = line.bottom + BETWEEN_LINES;
  }
  return { width, height: Math.max(0, top - BETWEEN_LINES), labelX: LABEL_X, lines };
}

/** As many in a line as fit, the lines filled alike: six that fit five are three and three. */
function evenly(count: number, fitting: number): number {
  const lines = Math.max(1, Math.ceil(count / fitting));
  return Math.max(1, Math.ceil(count / lines));
}

function axisEnd({ panels, references }: AgeRegionInput): number {
  const reach = Math.max(
    0,
    ...panels.flatMap(({ cells }) => cells.map(({ upper, share }) => upper ?? share ?? 0)),
    ...references.map((share) => share ?? 0),
  );
  return reach > 0 && reach <= HALF ? HALF : 1;
}

interface LineFrame {
  readonly top: number;
  readonly labels: number;
  readonly panelWidth: number;
  readonly end: number;
}

function layOutLine(
  input: AgeRegionInput,
  panels: readonly RegionPanel[],
  { top, labels, panelWidth, end }: LineFrame,
): PanelLine & { readonly bottom: number } {
  const airs = panels.map(({ air }) => wrapWords(air, panelWidth));
  const notes = panels.map(({ adjustedNote }) => wrapWords(adjustedNote, panelWidth));
  const headY = top + TEXT + most(airs) * TEXT + 12;
  const rowsTop = headY + 11;
  const rowsBottom = rowsTop + input.rows.length * ROW;
  const ticksY = rowsBottom + 16;
  const adjustedY = ticksY + 25;
  const counts = widestText(['cars', ...panels.flatMap(({ cells }) => cells.map((c) => c.count))]);
  const yOf = (index: number): number => rowsTop + index * ROW + ROW / 2;
  const chosen = input.rows.findIndex((row) => row.chosen);
  return {
    top,
    headY,
    rowsTop,
    rowsBottom,
    ticksY,
    adjustedY,
    bottom: adjustedY + 12 + most(notes) * TEXT,
    ages: input.rows.map((row, index) => ({ ...row, y: yOf(index) })),
    strip: chosen < 0 ? null : { y: rowsTop + chosen * ROW, height: ROW },
    panels: panels.map((panel, index) => {
      const left = labels + index * (panelWidth + BETWEEN);
      const countX = left + panelWidth;
      const plotRight = countX - Math.max(counts, textWidth('cars')) - 12;
      const place = (share: number): number => left + (share / end) * (plotRight - left);
      return {
        ...{ key: panel.key, left, plotRight, countX, top },
        name: shortened(panel.name, panelWidth),
        air: airs[index]!,
        ticks: ticksOf(end, place),
        cells: panel.cells.map((cell, row) => ({
          key: input.rows[row]!.key,
          y: yOf(row),
          count: cell.count,
          chosen: input.rows[row]!.chosen,
          kind: kindOf(cell),
          share: placed(cell, place),
          reference: placedOrNull(input.references[row], place),
        })),
        adjusted: panel.adjusted,
        adjustedRange: panel.adjustedRange,
        adjustedNote: notes[index]!,
      };
    }),
  };
}

function kindOf({ cars, share }: AgeRegionCell): PlacedCell['kind'] {
  return share !== null ? 'share' : cars > 0 ? 'few' : 'none';
}

function placed(
  { share, lower, upper }: AgeRegionCell,
  place: (share: number) => number,
): PlacedShare | null {
  return share === null
    ? null
    : { x: place(share), from: place(lower ?? share), to: place(upper ?? share) };
}

function placedOrNull(
  share: number | null | undefined,
  place: (share: number) => number,
): number | null {
  return share === null || share === undefined ? null : place(share);
}

function ticksOf(end: number, place: (share: number) => number): { x: number; text: string }[] {
  const per = end * 100;
  return [0, end / 2, end].map((share) => ({
    x: place(share),
    text: share === end ? `${per}\u202f%` : String(Math.round(share * 100)),
  }));
}

function most(lists: readonly (readonly string[])[]): number {
  return Math.max(0, ...lists.map((list) => list.length));
}

function shortened(text: string, width: number): string {
  if (textWidth(text, 600) <= width) return text;
  let kept = text;
  while (kept !== '' && textWidth(`${kept}…`, 600) > width) kept = kept.slice(0, -1);
  return `${kept.trimEnd()}…`;
}
