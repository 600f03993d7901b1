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
}

interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

const FROM_MARK = 12;
const HALF_LINE = 9;
const ABOVE = 20;
const STEPS_OF_LINE = 12;

/**
 * Finds a place for each sentence: left of its mark, else right, above or below, inside the plot, on no other sentence, and over as
 * little of the joined line as can be. The newest mark (the last wish) chooses first; one that finds no place is left out, its shape stays.
 */
export function placeFlags(
  wishes: readonly FlagWish[],
  line: readonly { readonly x: number; readonly y: number }[],
  plot: Box,
): Flag[] {
  const taken: Box[] = [];
  const points = line.flatMap((point, index) => between(line[index - 1], point));
  const flags: Flag[] = [];
  for (const wish of [...wishes].reverse()) {
    const best = candidates(wish)
      .filter(({ box }) => inside(box, plot) && !taken.some((other) => meet(box, other)))
      .map((candidate) => ({ ...candidate, covered: countCovered(candidate.box, points) }))
      .reduce<(Candidate & { covered: number }) | null>(
        (least, next) => (least === null || next.covered < least.covered ? next : least),
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
  return [
    { flag: { x: x - FROM_MARK, y, anchor: 'end', text }, box: at(x - FROM_MARK - width, y) },
    { flag: { x: x + FROM_MARK, y, anchor: 'start', text }, box: at(x + FROM_MARK, y) },
    { flag: { x, y: y - ABOVE, anchor: 'middle', text }, box: at(x - width / 2, y - ABOVE) },
    { flag: { x, y: y + ABOVE, anchor: 'middle', text }, box: at(x - width / 2, y + ABOVE) },
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
