import { generator, sampleSlopes } from './sample-slopes';
import { scanSlopes } from './scan-slopes';
import { slopeCount, type TimeGroup } from './slope-groups';

/** So many slopes are quickly written out and sorted. */
const FEW = 2 ** 20;
/** So many are looked at to choose the next interval. */
const SAMPLE = 2 ** 17;

/**
 * The slopes of two neighbouring ranks (0 the smallest) among those of all pairs, exactly, without writing them all out: a
 * sample proposes an interval around the rank, a scan counts what lies below and within it, and so on inside it until few
 * are left or all are equal. The sample decides only how fast that goes, never the answer; it comes from a generator that
 * starts the same every time. `few` is how many slopes may be written out and sorted.
 *
 * Source: interval contraction as in J. Matoušek, "Randomized optimal algorithm for slope selection", Information Processing
 * Letters 39 (1991) 183–187, with counting by groups of equal time in place of inversions.
 */
export function selectSlopes(
  groups: readonly TimeGroup[],
  first: number,
  last = first,
  few = FEW,
): [number, number] {
  const random = generator();
  let [low, high] = [-Infinity, Infinity];
  let left = slopeCount(groups);
  let under = 0;
  let sample =
    left > few ? sampleSlopes(groups, Math.min(SAMPLE, left), random) : new Float64Array(0);
  let isStuck = false;
  while (left > few) {
    if (sample.length < Math.min(64, left)) sample = sampleOf(groups, [low, high], left, random);
    const [from, to] = around(sample, (first - under) / left, isStuck ? 0 : 1.25);
    const share = sample.filter((slope) => slope >= from && slope <= to).length / sample.length;
    const stride = from === to ? () => Infinity : evenly((left * share) / SAMPLE, random);
    const scan = scanSlopes(groups, [from, to], stride, SAMPLE);
    const over = scan.below + scan.inside;
    const before = left;
    if (last < scan.below) {
      [high, left] = [nextDouble(from, -1), scan.below - under];
      sample = sample.filter((slope) => slope <= high);
    } else if (first >= over) {
      [low, left, under] = [nextDouble(to, 1), under + left - over, over];
      sample = sample.filter((slope) => slope >= low);
    } else if (first < scan.below || last >= over) {
      return [selectSlopes(groups, first, first, few)[0], selectSlopes(groups, last, last, few)[0]];
    } else {
      if (from === to) return [from, to];
      [low, high, left, under] = [from, to, scan.inside, scan.below];
      sample = new Float64Array(scan.taken).sort();
    }
    // Equal slopes at both ends can keep an interval from shrinking; a single slope as interval always parts it.
    isStuck = left > before / 2 && !isStuck;
  }
  const rest = scanSlopes(groups, [low, high], () => 1, left).taken.sort();
  return [rest[first - under] as number, rest[last - under] as number];
}

/** The slopes of a sorted sample that should enclose the share's quantile, so many standard errors of a half away. */
function around(sample: Float64Array, share: number, errors: number): [number, number] {
  const place = share * (sample.length - 1);
  const margin = errors * Math.sqrt(sample.length);
  const at = (index: number) =>
    sample[Math.min(sample.length - 1, Math.max(0, Math.round(index)))] as number;
  return [at(place - margin), at(place + margin)];
}

function sampleOf(
  groups: readonly TimeGroup[],
  within: readonly [number, number],
  left: number,
  random: () => number,
): Float64Array<ArrayBuffer> {
  return new Float64Array(
    scanSlopes(groups, within, evenly(left / SAMPLE, random), SAMPLE * 2).taken,
  ).sort();
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
