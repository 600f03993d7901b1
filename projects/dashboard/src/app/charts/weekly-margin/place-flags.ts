import { textWidth } from '../text-width';

/** A sentence beside a mark. */
export interface Flag {
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly text: string;
}

/** A mark with the sentence that belongs to it, and the room that may be used; px. */
export interface FlagWish {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  /** Rather over the line than left out. */
  readonly must?: boolean;
}

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

const FROM_MARK = 12;
const HALF_LINE = 9;
const NEAR = 20;
const FAR = 38;
const STEPS_OF_LINE = 12;
/** Steps of the line that a sentence may cover before it is left out; a step is about 2 px. */
const MOST_COVERED = 8;
/** What it costs to write across a level line, or over another mark, in steps of the line covered. */
const ACROSS = 4;
const OVER_MARK = 12;
const MARK = 8;

/**
 * Finds a place for each sentence: left of its mark, else right, above or below, near or a little off, inside the plot, on no other sentence, and over as
 * little of the joined line, of other marks and of the `levels` (heights of lines drawn across the plot) as can be. The last wish chooses first; one that finds no place is left out, its shape stays.
 */
export function placeFlags(
  wishes: readonly FlagWish[],
  line: readonly { readonly x: number; readonly y: number }[],
  plot: Box,
  levels: readonly number[] = [],
): Flag[] {
  const taken: Box[] = [];
  const points = line.flatMap((point, index) => between(line[index - 1], point));
  const flags: Flag[] = [];
  for (const wish of [...wishes].reverse()) {
    const best = candidates(wish)
      .filter(({ box }) => inside(box, plot) && !taken.some((other) => meet(box, other)))
      .map((candidate) => ({ ...candidate, covered: countCovered(candidate.box, points) }))
      .filter(({ covered }) => wish.must || covered <= MOST_COVERED)
      .map(({ flag, box, covered }) => ({
        flag,
        box,
        cost:
          covered +
          ACROSS * levels.filter((y) => y > box.top && y < box.bottom).length +
          OVER_MARK * wishes.filter((other) => other !== wish && hides(box, other)).length,
      }))
      .reduce<(Candidate & { cost: number }) | null>(
        (least, next) => (least === null || next.cost < least.cost ? next : least),
        null,
      );
    if (!best) continue;
    taken.push(best.box);
    flags.unshift(best.flag);
  }
  return flags;
}

interface Candidate {
  readonly flag: Flag;
  readonly box: Box;
}

function candidates({ x, y, text }: FlagWish): Candidate[] {
  const width = textWidth(text, 600);
  const at = (left: number, middle: number): Box => ({
    left,
    right: left + width,
    top: middle - HALF_LINE,
    bottom: middle + HALF_LINE,
  });
  const beside = (dy: number): Candidate[] => [
    {
      flag: { x: x - FROM_MARK, y: y + dy, anchor: 'end', text },
      box: at(x - FROM_MARK - width, y + dy),
    },
    {
      flag: { x: x + FROM_MARK, y: y + dy, anchor: 'start', text },
      box: at(x + FROM_MARK, y + dy),
    },
  ];
  const over = (dy: number): Candidate => ({
    flag: { x, y: y + dy, anchor: 'middle', text },
    box: at(x - width / 2, y + dy),
  });
  return [
    ...beside(0),
    ...[-NEAR, NEAR].flatMap((dy) => [over(dy), ...beside(dy)]),
    ...[-FAR, FAR].flatMap((dy) => [over(dy), ...beside(dy)]),
  ];
}

/** Points along the line from one mark to the next, the latter included. */
function between(
  from: { x: number; y: number } | undefined,
  to: { x: number; y: number },
): { x: number; y: number }[] {
  if (!from) return [to];
  return Array.from({ length: STEPS_OF_LINE }, (_, step) => {
    const part = (step + 1) / STEPS_OF_LINE;
    return { x: from.x + (to.x - from.x) * part, y: from.y + (to.y - from.y) * part };
  });
}

function countCovered(box: Box, points: readonly { x: number; y: number }[]): number {
  return points.filter(
    ({ x, y }) => x > box.left - 4 && x < box.right + 4 && y > box.top - 4 && y < box.bottom + 4,
  ).length;
}

function hides(box: Box, { x, y }: FlagWish): boolean {
  return x > box.left - MARK && x < box.right + MARK && y > box.top - MARK && y < box.bottom + MARK;
}

function inside(box: Box, plot: Box): boolean {
  return (
    box.left >= plot.left &&
    box.right <= plot.right &&
    box.top >= plot.top &&
    box.bottom <= plot.bottom
  );
}

function meet(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}
