import { join } from 'node:path';
import { openReader, type Connection } from '#db/database';
import { addOffice, get, signInOffice, timed } from './ask';
import { fill } from './fill';
import { median, ratioLine, type Line } from './report';
import { serve } from './serve';
import { Yardstick } from './yardstick';

const ROUNDS = 9;

/** One answer, what it must at least read, and the same numbers asked of the yardstick. */
export interface Compared {
  name: string;
  path: string;
  floor: readonly string[];
  yardstick: readonly string[];
}

/** What answers are compared on: a data folder, the sizes it is filled to one after another, and the business day. */
export interface Sizes {
  data: string;
  sizes: readonly number[];
  today: string;
}

/**
 * Answers through the API, as head office; at each size against the bare SQL and the yardstick, and from one size to the
 * next. `beside` measures more on the filled folder of a size, when nothing is served from it.
 */
export async function compareAnswers(
  { data, sizes, today }: Sizes,
  answers: readonly Compared[],
  beside: (bare: Connection, jobs: number) => Promise<Line[]> = async () => [],
): Promise<Line[]> {
  const lines: Line[] = [];
  const before = new Map<string, number>();
  let already = 0;
  for (const jobs of sizes) {
    await fill(data, jobs, today, already);
    if (already === 0) await addOffice(data);
    already = jobs;
    const bare = openReader(join(data, 'underseam.sqlite'));
    const yardstick = await Yardstick.of(bare);
    const served = await serve(data, { UNDERSEAM_NOW: `${today}T12:00:00Z` });
    const token = await signInOffice(served.url);
    for (const compared of answers) {
      const { ours, floor, theirs } = await measure(compared, served.url, token, bare, yardstick);
      const what = `${compared.name}, ${jobs} jobs, through the API, ms`;
      lines.push(
        ratioLine(what, ours, 'the bare SQL over the same rows, ms', floor, 'aim at most 3'),
        ratioLine(what, ours, 'the columnar engine over the same rows, ms', theirs, 'told, no aim'),
      );
      const smaller = before.get(compared.name);
      if (smaller !== undefined) {
        lines.push(
          ratioLine(
            what,
            ours,
            'the same at the size before, ms',
            smaller,
            'growth of the jobs is the aim',
          ),
        );
      }
      before.set(compared.name, ours);
    }
    await served.stop();
    lines.push(...(await beside(bare, jobs)));
    yardstick.close();
    bare.close();
  }
  return lines;
}

async function measure(
  { path, floor, yardstick: questions }: Compared,
  url: string,
  token: string,
  bare: Connection,
  yardstick: Yardstick,
): Promise<{ ours: number; floor: number; theirs: number }> {
  const times: { ours: number[]; floor: number[]; theirs: number[] } = {
    ours: [],
    floor: [],
    theirs: [],
  };
  // In turn, so that whatever else the machine does falls on all of them; the first round warms up.
  for (let round = 0; round <= ROUNDS; round += 1) {
    const ours = await timed(() => get(url + path, token));
    const least = await timed(() => {
      for (const text of floor) bare.driver.prepare(text).raw().all();
    });
    const theirs = await timed(() => yardstick.ask(...questions));
    if (round === 0) continue;
    times.ours.push(ours);
    times.floor.push(least);
    times.theirs.push(theirs);
  }
  return { ours: median(times.ours), floor: median(times.floor), theirs: median(times.theirs) };
}
