import type { Knex } from 'knex';

/** The network, its regions, branches, catalogue and dated costs; people, sign-ins and push keys. */
export async function up(knex: Knex): Promise<void> {
  await run(
    knex,
    `create table network (
      id integer primary key check (id = 1),
      name text not null,
      currency text not null,
      target_margin_share real,
      claim_limit_cents integer,
      generation integer not null default 0,
      restating integer not null default 0
    ) strict`,
    `insert into network (id, name, currency) values (1, 'Network', 'EUR')`,
    // Fee rates in millionths; the base rate of PUT /api/network is valid from the first day there is.
    `create table network_fees (
      from_date text primary key,
      fee_micros integer not null
    ) strict, without rowid`,
    `create table regions (
      id integer primary key,
      code text not null unique,
      name text not null,
      temperature_c real,
      humidity_pct real,
      so2_deposition real,
      chloride_deposition real
    ) strict`,
    `create table branches (
      id integer primary key,
      code text not null unique,
      name text not null,
      region_id integer not null references regions (id),
      time_zone text not null,
      opened_on text not null,
      closed_on text,
      target_margin_share real
    ) strict`,
    `create table branch_rates (
      branch_id integer not null references branches (id),
      from_date text not null,
      hourly_cost_cents integer not null,
      primary key (branch_id, from_date)
    ) strict, without rowid`,
    `create table products (
      id integer primary key,
      code text not null unique,
      name text not null,
      kind text not null
    ) strict`,
    `create table product_costs (
      product_id integer not null references products (id),
      from_date text not null,
      cost_per_litre_cents integer not null,
      primary key (product_id, from_date)
    ) strict, without rowid`,
    `create table consumable_costs (
      kind text not null,
      from_date text not null,
      unit_cost_cents integer not null,
      primary key (kind, from_date)
    ) strict, without rowid`,
    `create table packages (
      id integer primary key,
      code text not null unique,
      name text not null,
      warranty_months integer not null
    ) strict`,
    `create table norms (
      package_id integer not null references packages (id),
      body_type text not null,
      product_id integer not null references products (id),
      ml integer not null,
      primary key (package_id, body_type, product_id)
    ) strict, without rowid`,
    `create table people (
      id integer primary key,
      email text not null,
      email_key text not null unique,
      name text not null,
      role text not null,
      password_hash text,
      active integer not null default 1,
      created_at text not null,
      last_sign_in_at text
    ) strict`,
    `create table person_branches (
      person_id integer not null references people (id),
      branch_id integer not null references branches (id),
      primary key (person_id, branch_id)
    ) strict, without rowid`,
    `create table person_regions (
      person_id integer not null references people (id),
      region_id integer not null references regions (id),
      primary key (person_id, region_id)
    ) strict, without rowid`,
    // A refresh cookie is (sign-in, step, keyed hash); only the newest step issued is stored (rule 83).
    `create table sign_ins (
      id integer primary key,
      person_id integer not null references people (id),
      step integer not null,
      device text not null,
      started_at text not null,
      last_used_at text not null,
      expires_at text not null,
      ended_at text
    ) strict`,
    `create index sign_ins_by_person on sign_ins (person_id)`,
    `create table password_tokens (
      token_hash text primary key,
      person_id integer not null references people (id),
      purpose text not null,
      expires_at text not null,
      used_at text
    ) strict, without rowid`,
    `create table sign_in_failures (
      email_key text primary key,
      failures integer not null,
      first_at text not null,
      locked_until text
    ) strict, without rowid`,
    `create table push_keys (
      id text primary key,
      branch_id integer not null references branches (id),
      label text not null,
      secret_hash text not null,
      created_at text not null,
      created_by integer references people (id),
      last_used_at text,
      revoked_at text
    ) strict, without rowid`,
    `create table mails (
      id integer primary key,
      recipient text not null,
      subject text not null,
      text_body text not null,
      html_body text,
      created_at text not null,
      attempts integer not null default 0,
      next_attempt_at text,
      sent_at text,
      last_error text
    ) strict`,
    `create index mails_to_send on mails (next_attempt_at) where sent_at is null`,
  );
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
