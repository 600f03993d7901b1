import { join } from 'node:path';
import { addDays } from '#shared/domain/calendar';
import { defaultPeriod } from '#shared/domain/period';
import { STAGES } from '#shared/domain/vocabulary';
import { compareAnswers, type Compared } from './answers';
import type { Line } from './report';

/**
 * The answers about what lies underneath, over the default year and all branches and over one branch. The yardstick computes
 * every count, sum and quantile of the answer, not its intervals, models' shrinkage or slope.
 */
export function benchUnderneath(
  folder: string,
  sizes: readonly number[],
  today: string,
): Promise<Line[]> {
  return compareAnswers({ data: join(folder, 'underneath'), sizes, today }, everyAnswer(today));
}

function everyAnswer(today: string): Compared[] {
  const { from } = defaultPeriod(today);
  const year = `completed_on between '${from}' and '${today}'`;
  const branch = `${year} and branch_id = 7`;
  const seven = 'branch=B006';
  const since = `completed_on > '${addDays(today, -1096)}'`;
  const set = `model_key = 'velder\u001ftessock' and age_band = 2 and ${since}`;
  return [
    { name: 'rot, all branches', path: '/api/analytics/rot', ...rot(year) },
    { name: 'rot, one branch', path: `/api/analytics/rot?${seven}`, ...rot(branch) },
    { name: 'product use, all branches', path: '/api/analytics/products', ...products(year) },
    {
      name: 'product use, one branch',
      path: `/api/analytics/products?${seven}`,
      ...products(branch),
    },
    { name: 'come-backs, first page', path: '/api/come-back', ...comeBacks },
    {
      name: 'quote',
      path: '/api/quote?make=Velder&model=Tessock&firstRegistered=2013-05&bodyType=hatchback&package=full&branch=B006&marginShare=0.3',
      ...quote(`${set} and branch_id = 7`),
    },
  ];
}

function rot(where: string): Pick<Compared, 'floor' | 'yardstick'> {
  const cells = `select branch_id, age_band, count(*), sum(has_rot), sum(bubbles_worked), sum(bubbles_holed)
    from job_facts where ${where} group by 1, 2`;
  const models = `select model_key, age_band, count(*), sum(has_rot) from job_facts where ${where} group by 1, 2`;
  return {
    floor: [
      cells,
      models,
      `select age_band, rot_zones, count(*) from job_facts where ${where} and has_rot = 1 group by 1, 2`,
    ],
    yardstick: [
      cells,
      models,
      `select age_band, zone, side, count(distinct job_id) from job_findings join
        (select job_id, age_band from job_facts where ${where}) using (job_id)
        where seen_as <> 'surface' or worked_as <> 'surface' group by grouping sets ((1, 2), (1, 2, 3))`,
    ],
  };
}

function products(where: string): Pick<Compared, 'floor' | 'yardstick'> {
  return {
    floor: [
      `select product_id, package_id, body_type, ml, cost_cents from job_products where ${where}`,
      `select branch_id, norm_ml, normed_ml, temperature_c from job_facts where ${where}`,
    ],
    yardstick: [
      `select product_id, package_id, body_type, count(*), avg(ml), quantile_cont(ml, [0.1, 0.25, 0.5, 0.75, 0.9]),
        sum(cost_cents), count(*) filter (where ml < 2800), count(*) filter (where ml > 5200)
        from job_products where ${where} group by 1, 2, 3`,
      `select branch_id, count(*), sum(normed_ml) / sum(norm_ml), sum(normed_ml * normed_ml),
        sum(normed_ml * norm_ml), sum(norm_ml * norm_ml) from job_facts where ${where} and norm_ml > 0 group by 1`,
      `select product_id, floor(temperature_c / 5), count(*), quantile_cont(ml, [0.25, 0.5, 0.75])
        from job_products join (select job_id, temperature_c from job_facts where ${where}) using (job_id) group by 1, 2`,
    ],
  };
}

const LEFT = `from job_findings f where action in ('deferred', 'declined')`;
const DANGER = `case when structural = 1 and (seen_as = 'holed' or worked_as = 'holed') then 0
  when structural = 1 then 1 when seen_as = 'holed' or worked_as = 'holed' then 2 else 3 end`;
const comeBacks: Pick<Compared, 'floor' | 'yardstick'> = {
  floor: [
    `select count(*), sum(structural), count(distinct job_id) ${LEFT}`,
    `select job_id, ref ${LEFT} order by ${DANGER}, completed_on, job_id limit 50`,
  ],
  yardstick: [
    `select count(*), sum(structural), count(distinct job_id) ${LEFT}`,
    `select job_id, ref ${LEFT} order by ${DANGER}, completed_on, job_id limit 50`,
  ],
};

function quote(set: string): Pick<Compared, 'floor' | 'yardstick'> {
  const minutes = ['act_minutes', ...STAGES.map((stage) => `act_${stage}`)];
  const quantiles = minutes.map((column) => `quantile_cont(${column}, [0.5, 0.8])`);
  const used = (
    key: string,
  ): string => `select product_id, sum(ml) from job_products where ${key} in
    (select ${key.replace(/[()]/g, '')} from job_facts where ${set}) group by 1`;
  return {
    floor: [
      `select ${minutes.join(', ')}, has_rot from job_facts where ${set}`,
      // As the rows lie, so that the bare engine finds them at once.
      used('(branch_id, completed_on, job_id)'),
    ],
    yardstick: [
      `select count(*), sum(has_rot), ${quantiles.join(', ')} from job_facts where ${set}`,
      used('job_id'),
    ],
  };
}
