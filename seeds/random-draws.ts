import { uniformFloat64 } from 'pure-rand/distribution/uniformFloat64';
import { uniformInt } from 'pure-rand/distribution/uniformInt';
import { xoroshiro128plus } from 'pure-rand/generator/xoroshiro128plus';
import type { RandomGenerator } from 'pure-rand/types/RandomGenerator';

/** A source of random numbers. Always handed in, so that the same seed gives the same network. */
export type Random = RandomGenerator;

/** A source of its own for one stream of one seed (a branch's jobs, its claims), so that one stream never shifts another. */
export function randomFor(seed: number, stream: string): Random {
  return xoroshiro128plus(hashed(seed, stream));
}

/** A number in [0, 1). */
export function uniform(random: Random): number {
  return uniformFloat64(random);
}

/** Whether something that happens with this probability happens. */
export function chance(random: Random, probability: number): boolean {
  return uniformFloat64(random) < probability;
}

/** A whole number between two, both included. */
export function wholeBetween(random: Random, from: number, to: number): number {
  return uniformInt(random, from, to);
}

/** A number between two, evenly. */
export function between(random: Random, from: number, to: number): number {
  return from + uniformFloat64(random) * (to - from);
}

/** A normal deviate. Source: G. E. P. Box and M. E. Muller, "A note on the generation of random normal deviates", 1958. */
export function normal(random: Random, mean: number, deviation: number): number {
  const radius = Math.sqrt(-2 * Math.log(1 - uniformFloat64(random)));
  return mean + deviation * radius * Math.cos(2 * Math.PI * uniformFloat64(random));
}

/** A factor around 1 whose logarithm is normal with this deviation; its mean is 1. */
export function factorAround(random: Random, deviation: number): number {
  return Math.exp(normal(random, -(deviation * deviation) / 2, deviation));
}

/** A Poisson count for a small mean. Source: D. E. Knuth, "The Art of Computer Programming", vol. 2, 3.4.1. */
export function count(random: Random, mean: number): number {
  const floor = Math.exp(-mean);
  let product = uniformFloat64(random);
  let events = 0;
  while (product > floor) {
    product *= uniformFloat64(random);
    events += 1;
  }
  return events;
}

/** One of a list, each equally likely. */
export function pick<T>(random: Random, items: readonly T[]): T {
  return items[uniformInt(random, 0, items.length - 1)] as T;
}

/** One of a list, as likely as its weight among all weights. */
export function pickWeighted<T>(random: Random, items: readonly (readonly [T, number])[]): T {
  let all = 0;
  for (const [, weight] of items) all += weight;
  let left = uniformFloat64(random) * all;
  for (const [item, weight] of items) {
    left -= weight;
    if (left < 0) return item;
  }
  return (items[items.length - 1] as readonly [T, number])[0];
}

/** FNV-1a over the stream's name, started from the seed. */
function hashed(seed: number, stream: string): number {
  let hash = 0x811c9dc5 ^ seed;
  for (let index = 0; index < stream.length; index += 1) {
    hash = Math.imul(hash ^ stream.charCodeAt(index), 0x01000193);
  }
  return hash | 0;
}
