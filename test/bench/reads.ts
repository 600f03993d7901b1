import { join } from 'node:path';
import { openReader, type Connection } from '#db/database';
import { defaultPeriod } from '#shared/domain/period';
import { STAGES } from '#shared/domain/vocabulary';
import { addOffice, get, signInOffice, timed } from './ask';
import { fill } from './fill';
import { median, ratioLine, type Line } from './report';
import { serve } from './serve';

const ROUNDS = 15;

/** The two analytics answers over the default year and all branches, through the API, against the bare SQL that reads the same rows. */
export async function benchReads(folder: string, jobs: number, today: string): Promise<Line[]> {
  const data = join(folder, 'reads');
  await fill(data, jobs, today);
  await addOffice(data);
  const served = await serve(data, { UNDERSEAM_NOW: `${today}T12:00:00Z` });
  const token = await signInOffice(served.url);
  const { from } = defaultPeriod(today);
  const bare = openReader(join(data, 'underseam.sqlite'));
  const lines: Line[] = [];
  for (const [name, path, floor] of [
    ['weekly margin', '/api/analytics/margin', marginFloor],
    ['overrun by stage', '/api/analytics/overrun?by=stage', overrunFloor],
  ] as const) {
    const ours: number[] = [];
    const theirs: number[] = [];
    // In turn, so that whatever else the machine does falls on both.
    for (let round = 0; round < ROUNDS; round += 1) {
      ours.push(await timed(() => get(served.url + path, token)));
      theirs.push(await timed(() => floor(bare, from, today)));
    }
    lines.push(
      ratioLine(
        `${name}, ${jobs} jobs, all branches, through the API, ms`,
        median(ours),
        'the bare SQL sums over the same rows, ms',
        median(theirs),
        'aim at most 3',
      ),
    );
  }
  bare.close();
  await served.stop();
  return lines;
}

/** What any answer must at least read: the sums by week. */
function marginFloor(bare: Connection, from: string, to: string): void {
  bare
    .prepare(
      `select week, count(*), sum(billed), sum(revenue_cents), sum(labour_cents), sum(repair_labour_cents),
        sum(product_cents), sum(consumables_cents), sum(bought_in_cents), sum(fee_cents),
        sum(exp_price_cents), sum(exp_labour_cents), sum(exp_product_cents), sum(exp_fee_cents)
        from job_facts where completed_on between ? and ? group by week`,
    )
    .all(from, to);
}

/** What any answer must at least read: the minutes of every estimated job, for the quantiles. */
function overrunFloor(bare: Connection, from: string, to: string): void {
  const columns = STAGES.flatMap((stage) => [`est_${stage}`, `act_${stage}`]).join(', ');
  bare.driver
    .prepare(
      `select est_minutes, act_minutes, ${columns} from job_facts
        where completed_on between ? and ? and has_estimate = 1`,
    )
    .raw()
    .all(from, to);
}
