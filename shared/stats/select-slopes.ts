import { generator, sampleSlopes } from './sample-slopes';
import { scanSlopes } from './scan-slopes';
import { slopeCount, type TimeGroup } from './slope-groups';

/** Slopes looked at to choose the next interval: at least and at most so many. */
const LEAST_SAMPLE = 2 ** 12;
const MOST_SAMPLE = 2 ** 17;

/**
 * The slopes of some ranks (0 the smallest, ascending) among those of all pairs, exactly, without writing them all out: a
 * sample proposes an interval around the ranks, a scan counts what lies below and within it, and so on inside it until few
 * are left or all are equal. The sample decides only how fast that goes, never the answer; it comes from a generator that
 * starts the same every time. `few` is how many slopes may be written out and sorted.
 *
 * Source: interval contraction as in J. Matoušek, "Randomized optimal algorithm for slope selection", Information Processing
 * Letters 39 (1991) 183–187, with counting by groups of equal time in place of inversions.
 */
export function selectSlopes(
  groups: readonly TimeGroup[],
  ranks: readonly number[],
  few = 2 * sampleSize(groups),
): number[] {
  const size = sampleSize(groups);
  const random = generator();
  const left = slopeCount(groups);
  const sample = left > few ? sampleSlopes(groups, Math.min(size, left), random) : NONE;
  const all = { low: -Infinity, high: Infinity, left, under: 0, sample };
  return selectWithin({ groups, size, few, random }, ranks, all);
}

const NONE = new Float64Array(0);

/** What a search works with from its first interval to its last. */
interface Search {
  groups: readonly TimeGroup[];
  /** Slopes of a sample. */
  size: number;
  few: number;
  random: () => number;
}

/** A closed interval, the slopes left in it and those under it, and a sorted sample of those left. */
interface Interval {
  low: number;
  high: number;
  left: number;
  under: number;
  sample: Float64Array;
}

function selectWithin(search: Search, ranks: readonly number[], within: Interval): number[] {
  const { groups, size, few, random } = search;
  let interval = within;
  let isStuck = false;
  while (interval.left > few) {
    const { low, high, left, under } = interval;
    const apart = partedAt(ranks, left);
    if (apart > 0) {
      return [ranks.slice(0, apart), ranks.slice(apart)].flatMap((own) =>
        selectWithin(search, own, interval),
      );
    }
    const sample =
      interval.sample.length < Math.min(64, left) ? sampleOf(search, interval) : interval.sample;
    const [from, to] = isStuck
      ? around(sample, [placeOf(ranks[0], interval), placeOf(ranks[0], interval)], 0)
      : around(sample, [placeOf(ranks[0], interval), placeOf(ranks.at(-1), interval)], 1.25);
    const [start, end] = [firstAbove(sample, nextDouble(from, -1)), firstAbove(sample, to)];
    const share = (end - start) / sample.length;
    const stride = from === to ? () => Infinity : evenly((left * share) / size, random);
    const scan = scanSlopes(groups, [from, to], stride, size);
    const over = scan.below + scan.inside;
    const parts: [number[], Interval][] = [
      [
        ranks.filter((rank) => rank < scan.below),
        {
          low,
          high: nextDouble(from, -1),
          left: scan.below - under,
          under,
          sample: sample.subarray(0, start),
        },
      ],
      [
        ranks.filter((rank) => rank >= scan.below && rank < over),
        {
          low: from,
          high: to,
          left: scan.inside,
          under: scan.below,
          sample: new Float64Array(scan.taken).sort(),
        },
      ],
      [
        ranks.filter((rank) => rank >= over),
        {
          low: nextDouble(to, 1),
          high,
          left: under + left - over,
          under: over,
          sample: sample.subarray(end),
        },
      ],
    ];
    const holding = parts.filter(([own]) => own.length > 0);
    const [only, ...others] = holding;
    if (!only || others.length > 0) {
      return holding.flatMap(([own, part]) =>
        part.low === part.high ? own.map(() => part.low) : selectWithin(search, own, part),
      );
    }
    interval = only[1];
    if (interval.low === interval.high) return ranks.map(() => interval.low);
    // Equal slopes at both ends can keep an interval from shrinking; a single slope as interval always parts it.
    isStuck = interval.left > left / 2 && !isStuck;
  }
  const rest = scanSlopes(
    groups,
    [interval.low, interval.high],
    () => 1,
    interval.left,
  ).taken.sort();
  return ranks.map((rank) => rest[rank - interval.under] as number);
}

/** Where ranks are better looked for apart: at their widest gap, once it is much of what is left; else 0. */
function partedAt(ranks: readonly number[], left: number): number {
  let widest = 0;
  let apart = 0;
  for (let index = 1; index < ranks.length; index += 1) {
    const gap = (ranks[index] as number) - (ranks[index - 1] as number);
    if (gap > widest) [widest, apart] = [gap, index];
  }
  return widest > left / 16 ? apart : 0;
}

/** Where a rank lies among the slopes of an interval, as a share of them. */
function placeOf(rank: number | undefined, { left, under }: Interval): number {
  return ((rank ?? under) - under) / left;
}

/** A sample that takes about as long to sort as a scan takes: a larger one saves scans, a smaller one sorting. */
function sampleSize(groups: readonly TimeGroup[]): number {
  let points = 0;
  for (const { values } of groups) points += values.length;
  return Math.min(MOST_SAMPLE, Math.max(LEAST_SAMPLE, Math.round((points * groups.length) / 16)));
}

/** The slopes of a sorted sample that should enclose those at two shares, so many standard errors of a half away. */
function around(
  sample: Float64Array,
  [first, last]: readonly [number, number],
  errors: number,
): [number, number] {
  const margin = errors * Math.sqrt(sample.length);
  const at = (place: number): number =>
    sample[Math.min(sample.length - 1, Math.max(0, Math.round(place)))] as number;
  const end = sample.length - 1;
  return [at(first * end - margin), at(last * end + margin)];
}

function sampleOf({ groups, size, random }: Search, { low, high, left }: Interval): Float64Array {
  const { taken } = scanSlopes(groups, [low, high], evenly(left / size, random), size * 2);
  return new Float64Array(taken).sort();
}

/** How many of a sorted sample are no greater than a value. */
function firstAbove(sample: Float64Array, value: number): number {
  let [low, high] = [0, sample.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sample[middle] as number) <= value) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Steps of a mean length of at least 1, jittered so that no pattern in the data can meet them. */
function evenly(mean: number, random: () => number): () => number {
  return mean <= 1 ? () => 1 : () => Math.max(1, Math.round(2 * mean * random()));
}

/** The double next to a finite one, up or down. */
function nextDouble(value: number, direction: 1 | -1): number {
  if (value === 0) return direction * Number.MIN_VALUE;
  const bits = new BigInt64Array(new Float64Array([value]).buffer);
  bits[0] = (bits[0] as bigint) + BigInt(value > 0 ? direction : -direction);
  return new Float64Array(bits.buffer)[0] as number;
}
