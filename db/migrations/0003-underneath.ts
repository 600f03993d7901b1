import type { Knex } from 'knex';
import { appendOnly, neverReplaced } from './append-only';

/** As the vocabulary stands with this migration; the bit of a place is 3 × zone + side. */
const ZONES = [
  ...['front_wing', 'front_arch', 'bulkhead_drain', 'sill_outer', 'sill_inner', 'floor'],
  ...['jacking_point', 'chassis_rail', 'front_subframe', 'rear_arch', 'rear_subframe'],
  ...['boot_floor', 'door_bottom', 'slam_panel', 'tailgate'],
];
const SIDES = ['left', 'right', 'centre'];

/**
 * What lies underneath: on a job's flat row the places of its rot, how its bubbles opened and its product against the norm;
 * products by branch and day; what is left on cars, and the marks people set on it.
 */
export async function up(knex: Knex): Promise<void> {
  await run(
    knex,
    ...['rot_zones', 'bubbles_worked', 'bubbles_holed', 'norm_ml', 'normed_ml'].map(added),
    added('bought_in_sent_cents'),
    `update job_facts set
      rot_zones = coalesce((select sum(bit) from (
        select distinct 1 << (3 * (${placeOf('zone', ZONES)}) + ${placeOf('side', SIDES)}) as bit
          from job_findings f where f.job_id = job_facts.job_id
          and (seen_as <> 'surface' or coalesce(worked_as, 'surface') <> 'surface'))), 0),
      bubbles_worked = (select count(*) from job_findings f where f.job_id = job_facts.job_id
        and seen_as = 'bubbling' and worked_as is not null),
      bubbles_holed = (select count(*) from job_findings f where f.job_id = job_facts.job_id
        and seen_as = 'bubbling' and worked_as = 'holed'),
      norm_ml = coalesce((select sum(ml) from norms n
        where n.package_id = job_facts.package_id and n.body_type = job_facts.body_type), 0),
      normed_ml = coalesce((select sum(p.ml) from job_products p
        join norms n on n.product_id = p.product_id and n.package_id = job_facts.package_id
          and n.body_type = job_facts.body_type
        where p.job_id = job_facts.job_id and p.gen_from = job_facts.gen_from), 0),
      bought_in_sent_cents = coalesce((select json_extract(content, '$.boughtInCents')
        from job_revisions r where r.job_id = job_facts.job_id
        and r.revision = job_facts.revision), 0)`,
    // Clustered as it is read, with what is asked of a product: which package and car it went into, and how warm it was.
    `create table job_products_by_day (
      branch_id integer not null references branches (id),
      completed_on text not null,
      job_id integer not null references jobs (id),
      product_id integer not null references products (id),
      gen_from integer not null,
      gen_to integer not null,
      package_id integer not null references packages (id),
      body_type text not null,
      temperature_c real,
      ml integer not null,
      cost_cents integer,
      primary key (branch_id, completed_on, job_id, product_id, gen_from)
    ) strict, without rowid`,
    `insert into job_products_by_day
      select f.branch_id, f.completed_on, f.job_id, p.product_id, p.gen_from, p.gen_to, f.package_id,
        f.body_type, f.temperature_c, p.ml, p.cost_cents
      from job_products p join job_facts f on f.job_id = p.job_id and f.gen_from = p.gen_from
      order by 1, 2, 3, 4, 5`,
    `drop table job_products`,
    `alter table job_products_by_day rename to job_products`,
    `alter table job_findings add column completed_on text not null default ''`,
    `alter table job_findings add column vehicle_key text`,
    `update job_findings set (completed_on, vehicle_key) = (
      select completed_on, vehicle_key from job_facts f where f.job_id = job_findings.job_id limit 1)`,
    `create index job_findings_left on job_findings (branch_id, job_id)
      where action in ('deferred', 'declined')`,
    `create index job_findings_mended on job_findings (branch_id, vehicle_key, zone, side, completed_on)
      where action in ('treated', 'patched') and vehicle_key is not null`,
    // Every mark that was ever set stands; the newest revision holds.
    `create table come_back_marks (
      id integer primary key,
      branch_id integer not null references branches (id),
      job_id integer not null references jobs (id),
      ref text not null,
      revision integer not null,
      status text not null,
      due_on text,
      note text not null,
      owner_told_on text,
      person_id integer not null references people (id),
      changed_at text not null,
      unique (job_id, ref, revision)
    ) strict`,
    appendOnly('come_back_marks', 'update'),
    appendOnly('come_back_marks', 'delete'),
    neverReplaced('come_back_marks', 'job_id', 'ref', 'revision'),
  );
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

function added(column: string): string {
  return `alter table job_facts add column ${column} integer not null default 0`;
}

function placeOf(column: string, words: readonly string[]): string {
  const cases = words.map((word, place) => `when '${word}' then ${place}`);
  return `case ${column} ${cases.join(' ')} end`;
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
