import type { Knex } from 'knex';
import { appendOnly, neverReplaced } from './append-only';

/** Photos of claims, issued warranty reports, and the schedule that issues them. */
export async function up(knex: Knex): Promise<void> {
  await run(
    knex,
    `create table claim_photos (
      id integer primary key,
      branch_id integer not null references branches (id),
      claim_ref text not null,
      photo_ref text not null,
      storage_key text not null,
      sent_hash text not null,
      width integer not null,
      height integer not null,
      bytes integer not null,
      received_at text not null,
      person_id integer references people (id),
      push_key_id text references push_keys (id),
      unique (branch_id, claim_ref, photo_ref)
    ) strict`,
    // As issued: what a report said, its rows and its printed form are kept together and never changed.
    `create table warranty_reports (
      id integer primary key,
      as_of text not null,
      issued_at text not null,
      person_id integer references people (id),
      summary text not null,
      report text not null,
      csv text not null,
      csv_sha256 text not null,
      pdf blob not null,
      pdf_sha256 text not null
    ) strict`,
    appendOnly('warranty_reports', 'update'),
    appendOnly('warranty_reports', 'delete'),
    neverReplaced('warranty_reports', 'id'),
    `create table warranty_schedule (
      id integer primary key check (id = 1),
      active integer not null,
      day_of_month integer not null,
      people text not null,
      changed_at text not null,
      changed_by integer not null references people (id)
    ) strict`,
    // One run a month: the key is what makes a second one impossible.
    `create table warranty_runs (
      month text primary key,
      at text not null,
      report_id integer not null references warranty_reports (id)
    ) strict, without rowid`,
    `alter table mails add column report_run text references warranty_runs (month)`,
    `create index claims_by_branch_day on claims (branch_id, made_on)`,
    `create index claim_revisions_received on claim_revisions (received_at)`,
  );
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
