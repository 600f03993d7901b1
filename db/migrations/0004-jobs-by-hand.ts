import type { Knex } from 'knex';

/**
 * Jobs that people send: those under way, photos, files and what their columns mean; which mails a person does without; and
 * ways into the audit trail by what was done and to what.
 */
export async function up(knex: Knex): Promise<void> {
  await run(
    knex,
    `create table jobs_under_way (
      branch_id integer not null references branches (id),
      job_ref text not null,
      revision integer not null,
      content text not null,
      started_by integer not null references people (id),
      started_at text not null,
      changed_by integer not null references people (id),
      changed_at text not null,
      primary key (branch_id, job_ref)
    ) strict`,
    // By the reference of the job rather than its row: a photo may come while the job is under way.
    `create table photos (
      id integer primary key,
      branch_id integer not null references branches (id),
      job_ref text not null,
      photo_ref text not null,
      finding_ref text,
      storage_key text not null,
      sent_hash text not null,
      width integer not null,
      height integer not null,
      bytes integer not null,
      received_at text not null,
      person_id integer references people (id),
      push_key_id text references push_keys (id),
      unique (branch_id, job_ref, photo_ref)
    ) strict`,
    `create table imports (
      id text primary key,
      branch_id integer not null references branches (id),
      kind text not null,
      file_name text not null,
      stored_file text not null,
      bytes integer not null,
      sha256 text not null,
      received_at text not null,
      person_id integer not null references people (id),
      state text not null,
      options text not null,
      columns text not null,
      counts text not null,
      preview text not null,
      refused_preview text not null,
      rows_done integer not null,
      rows_of integer,
      written text not null,
      ended_at text,
      problem text
    ) strict, without rowid`,
    `create index imports_by_branch on imports (branch_id, received_at)`,
    // What a heading means to a branch, as a person last said it; null: it is left out.
    `create table import_columns (
      branch_id integer not null references branches (id),
      kind text not null,
      heading_key text not null,
      field text,
      primary key (branch_id, kind, heading_key)
    ) strict, without rowid`,
    `create table mail_choices (
      person_id integer not null references people (id),
      kind text not null,
      wanted integer not null,
      primary key (person_id, kind)
    ) strict, without rowid`,
    // Without regard to case, because that is how the trail is searched: from the beginning of a word.
    `create index audit_by_subject on audit_events (subject collate nocase, id)`,
    `create index audit_by_action on audit_events (action collate nocase, id)`,
    `create index audit_by_actor on audit_events (actor collate nocase, id)`,
    `create index audit_by_time on audit_events (at, id)`,
    `create index jobs_voided on jobs (branch_id, voided_at) where voided_at is not null`,
  );
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
