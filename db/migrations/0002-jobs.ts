import type { Knex } from 'knex';

const STAGES = ['strip', 'clean', 'dry', 'repair', 'mask', 'apply', 'refit'];
const CHECKS = [
  'liners_off',
  'both_directions',
  'brakes_covered',
  'dried_out',
  'drains_clear',
  'primer_cured',
];

/**
 * Jobs as received (append-only revisions hold the whole content), and the flat rows derived from the newest revision.
 * A derived row is visible while gen_from ≤ network.generation < gen_to, so that a restatement switches in one commit.
 */
export async function up(knex: Knex): Promise<void> {
  await run(
    knex,
    `create table jobs (
      id integer primary key,
      branch_id integer not null references branches (id),
      job_ref text not null,
      revision integer not null,
      warranty_months integer not null,
      voided_at text,
      unique (branch_id, job_ref)
    ) strict`,
    // With a row id, because a content of a kilobyte would overflow a page of a table without one.
    `create table job_revisions (
      id integer primary key,
      job_id integer not null references jobs (id),
      revision integer not null,
      change text not null,
      content text not null,
      received_at text not null,
      source text not null,
      person_id integer references people (id),
      push_key_id text references push_keys (id),
      unique (job_id, revision)
    ) strict`,
    appendOnly('job_revisions', 'update'),
    appendOnly('job_revisions', 'delete'),
    neverReplaced('job_revisions', 'job_id', 'revision'),
    // Clustered as it is read, by branch and day: a year of a branch lies together on a few pages.
    `create table job_facts (
      job_id integer not null references jobs (id),
      gen_from integer not null,
      gen_to integer not null,
      branch_id integer not null references branches (id),
      job_ref text not null,
      revision integer not null,
      completed_on text not null,
      week text not null,
      month text not null,
      make text not null,
      model text not null,
      model_key text not null,
      search_text text not null,
      vehicle_key text,
      first_registered text not null,
      age_band integer not null,
      body_type text not null,
      package_id integer not null references packages (id),
      has_rot integer not null,
      billed integer not null,
      warranty_months integer not null,
      ${STAGES.map((stage) => `est_${stage} integer not null,`).join('\n      ')}
      ${STAGES.map((stage) => `act_${stage} integer not null,`).join('\n      ')}
      est_minutes integer not null,
      act_minutes integer not null,
      has_estimate integer not null,
      charged_repair_minutes integer not null,
      extra_minutes integer not null,
      extra_cents integer not null,
      costed integer not null,
      revenue_cents integer not null,
      labour_cents integer not null,
      repair_labour_cents integer not null,
      product_cents integer not null,
      consumables_cents integer not null,
      bought_in_cents integer not null,
      fee_cents integer not null,
      margin_cents integer not null,
      expected integer not null,
      exp_price_cents integer not null,
      exp_labour_cents integer not null,
      exp_repair_labour_cents integer not null,
      exp_product_cents integer not null,
      exp_fee_cents integer not null,
      exp_margin_cents integer not null,
      missing_costs text,
      temperature_c real,
      humidity_pct real,
      ${CHECKS.map((check) => `check_${check} text`).join(',\n      ')},
      primary key (branch_id, completed_on, job_id, gen_from)
    ) strict, without rowid`,
    `create unique index job_facts_by_job on job_facts (job_id, gen_from)`,
    `create table job_products (
      job_id integer not null references jobs (id),
      product_id integer not null references products (id),
      branch_id integer not null references branches (id),
      gen_from integer not null,
      gen_to integer not null,
      ml integer not null,
      cost_cents integer,
      primary key (job_id, product_id, gen_from)
    ) strict, without rowid`,
    `create table job_findings (
      job_id integer not null references jobs (id),
      ref text not null,
      branch_id integer not null references branches (id),
      zone text not null,
      side text not null,
      seen_as text not null,
      worked_as text,
      structural integer not null,
      action text not null,
      repair_minutes integer not null,
      charged_cents integer not null,
      primary key (job_id, ref)
    ) strict, without rowid`,
    `create table job_consumables (
      job_id integer not null references jobs (id),
      line integer not null,
      branch_id integer not null references branches (id),
      kind text not null,
      quantity integer not null,
      unit_cost_cents integer,
      primary key (job_id, line)
    ) strict, without rowid`,
    `create table job_extras (
      job_id integer not null references jobs (id),
      line integer not null,
      branch_id integer not null references branches (id),
      agreed_on text not null,
      minutes integer not null,
      price_cents integer not null,
      note text,
      primary key (job_id, line)
    ) strict, without rowid`,
    `create table claims (
      id integer primary key,
      branch_id integer not null references branches (id),
      job_id integer not null references jobs (id),
      claim_ref text not null,
      revision integer not null,
      made_on text not null,
      zone text not null,
      cause text not null,
      decision text not null,
      proposed_decision text,
      decided_on text,
      labour_minutes integer not null,
      product_ml integer not null,
      cost_cents integer not null,
      paid_on text,
      unique (branch_id, claim_ref)
    ) strict`,
    `create index claims_by_job on claims (job_id)`,
    `create table claim_revisions (
      id integer primary key,
      claim_id integer not null references claims (id),
      revision integer not null,
      content text not null,
      received_at text not null,
      source text not null,
      person_id integer references people (id),
      push_key_id text references push_keys (id),
      unique (claim_id, revision)
    ) strict`,
    appendOnly('claim_revisions', 'update'),
    appendOnly('claim_revisions', 'delete'),
    neverReplaced('claim_revisions', 'claim_id', 'revision'),
    `create table bookings (
      branch_id integer not null references branches (id),
      ref text not null,
      expected_on text not null,
      package_id integer not null references packages (id),
      body_type text not null,
      primary key (branch_id, ref)
    ) strict, without rowid`,
    `create table week_notes (
      branch_id integer not null references branches (id),
      week text not null,
      text text not null,
      person_id integer not null references people (id),
      changed_at text not null,
      primary key (branch_id, week)
    ) strict, without rowid`,
    // The audit trail: nothing is changed or removed, and each row's hash covers the one before it.
    `create table audit_events (
      id integer primary key,
      at text not null,
      actor text not null,
      person_id integer,
      push_key_id text,
      address text not null,
      action text not null,
      subject text not null,
      branch_id integer,
      detail text not null,
      previous_hash text not null,
      hash text not null
    ) strict`,
    appendOnly('audit_events', 'update'),
    appendOnly('audit_events', 'delete'),
    neverReplaced('audit_events', 'id'),
  );
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

function appendOnly(table: string, change: 'update' | 'delete'): string {
  return `create trigger ${table}_no_${change} before ${change} on ${table}
    begin select raise(abort, '${table} is append-only'); end`;
}

/** `replace into` removes a row without the triggers of removal, so a key that is there already is refused as such. */
function neverReplaced(table: string, ...key: string[]): string {
  const same = key.map((column) => `${column} = new.${column}`).join(' and ');
  return `create trigger ${table}_no_replace before insert on ${table}
    when exists (select 1 from ${table} where ${same})
    begin select raise(abort, '${table} is append-only'); end`;
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
