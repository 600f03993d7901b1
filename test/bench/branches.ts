import { join } from 'node:path';
import type { Connection } from '#db/database';
import { HEAD_OFFICE, Scope } from '#db/scope';
import { Store } from '#db/store';
import { defaultPeriod } from '#shared/domain/period';
import { STAGES } from '#shared/domain/vocabulary';
import { ReadPool } from '#server/workers/read-pool';
import { compareAnswers, type Compared } from './answers';
import { timed } from './ask';
import { median, ratioLine, type Line } from './report';

const LOOKS = 5;

/**
 * The answers that compare branches, over the default year and all branches, and a look for signals over the whole network.
 * The yardstick computes every sum of the answer, not its adjustment, limits or intervals; the jobs of a bench have no claims.
 */
export function benchBranches(
  folder: string,
  sizes: readonly number[],
  today: string,
): Promise<Line[]> {
  const data = join(folder, 'branches');
  return compareAnswers({ data, sizes, today }, everyAnswer(today), async (bare, jobs) => [
    await lookLine(data, bare, jobs, today),
  ]);
}

function everyAnswer(today: string): Compared[] {
  const { from, to } = defaultPeriod(today);
  const year = `completed_on between '${from}' and '${to}'`;
  const asked = '/api/analytics/branches';
  const overrun = squaresOf('has_estimate = 1', 'act_minutes', 'est_minutes', year);
  const three = 'branch=B006&branch=B007&branch=B008';
  return [
    alike('overrun of branches', `${asked}?measure=overrun`, overrun),
    alike(
      'product of branches',
      `${asked}?measure=product`,
      squaresOf('norm_ml > 0', 'normed_ml', 'norm_ml', year),
    ),
    {
      name: 'claims of branches',
      path: `${asked}?measure=claims`,
      floor: [`select branch_id, package_id, age_band, completed_on from job_facts where ${year}`],
      // 36 months of cover, as the one package of the bench has.
      yardstick: [
        `select branch_id, package_id, age_band, count(*),
          sum(least(date_diff('day', completed_on, date '${today}'), 1096)) from job_facts
          where ${year} group by 1, 2, 3`,
      ],
    },
    alike(
      'weeks of branches',
      `${asked}/weeks?measure=overrun`,
      `select branch_id, week, count(*), sum(act_minutes), sum(est_minutes)
        from job_facts where has_estimate = 1 and ${year} group by 1, 2`,
    ),
    alike('three branches side by side', `${asked}/side-by-side?measure=overrun&${three}`, overrun),
  ];
}

/** An answer whose sums both engines are asked for in the same words. */
function alike(name: string, path: string, question: string): Compared {
  return { name, path, floor: [question], yardstick: [question] };
}

/** Sums, squares and stages of a ratio by branch, package and age. */
function squaresOf(counted: string, a: string, e: string, where: string): string {
  const stages = STAGES.map((stage) => `sum(act_${stage})`).join(', ');
  return `select branch_id, package_id, age_band, count(*), sum(${e}), sum(1.0 * ${a} * ${a}),
    sum(1.0 * ${a} * ${e}), sum(1.0 * ${e} * ${e}), ${stages}
    from job_facts where ${counted} and ${where} group by 1, 2, 3`;
}

/** A look on a thread of its own, as each night, beside reading once every row of cars that it could be about. */
async function lookLine(
  data: string,
  bare: Connection,
  jobs: number,
  today: string,
): Promise<Line> {
  const store = await Store.open(data);
  const reads = new ReadPool(store.file);
  const scope = Scope.ofGrant(store.state.branches, HEAD_OFFICE);
  const question = { today, now: `${today}T12:00:00.000Z` };
  const [ours, floor]: [number[], number[]] = [[], []];
  for (let round = 0; round <= LOOKS; round += 1) {
    const look = await timed(() => reads.answer('signalLook', scope, question));
    const read = await timed(() =>
      bare.driver
        .prepare(
          'select branch_id, week, completed_on, est_minutes, act_minutes, margin_cents from job_facts',
        )
        .raw()
        .all(),
    );
    if (round === 0) continue;
    ours.push(look);
    floor.push(read);
  }
  await reads.close();
  store.close();
  return ratioLine(
    `look for signals, ${jobs} jobs, ms`,
    median(ours),
    'reading every car once, ms',
    median(floor),
    'told, no aim',
  );
}
