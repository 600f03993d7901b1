import type { Knex } from 'knex';
import { appendOnly, neverReplaced } from './append-only';

/** Comparing branches and noticing in time: signals, actions agreed with branches, targets, and the digests sent. */
export async function up(knex: Knex): Promise<void> {
  await run(
    knex,
    // `behind`: ids of the branches behind the network figure that it compares with; null when it compares with none.
    `create table signals (
      id integer primary key,
      branch_id integer not null references branches (id),
      kind text not null,
      key text not null,
      measure text,
      since text not null,
      opened_on text not null,
      last_seen_on text not null,
      over_on text,
      strength real not null,
      facts text not null,
      cars integer not null,
      job_refs text not null,
      behind text,
      acknowledged_by integer references people (id),
      acknowledged_at text,
      note text
    ) strict`,
    // One of a kind at a time: what makes a second look on the same day find nothing new.
    `create unique index signals_not_over on signals (branch_id, kind, key) where over_on is null`,
    `create index signals_by_branch on signals (branch_id, opened_on)`,
    // One look a business day.
    `create table signal_looks (
      day text primary key,
      at text not null,
      opened integer not null,
      ended integer not null
    ) strict, without rowid`,
    `create table actions (
      id integer primary key,
      branch_id integer not null references branches (id),
      what text not null,
      who text not null,
      until_on text not null,
      measure text not null,
      state text not null,
      agreed_on text not null,
      agreed_at text not null,
      person_id integer not null references people (id),
      ended_on text,
      signal_id integer references signals (id)
    ) strict`,
    `create index actions_by_branch on actions (branch_id, state, until_on)`,
    `create table action_answers (
      id integer primary key,
      branch_id integer not null references branches (id),
      action_id integer not null references actions (id),
      person_id integer not null references people (id),
      at text not null,
      text text not null
    ) strict`,
    appendOnly('action_answers', 'update'),
    appendOnly('action_answers', 'delete'),
    neverReplaced('action_answers', 'id'),
    `create index action_answers_by_action on action_answers (action_id)`,
    // The margin's target stands where quotes read it: on the network and on the branch.
    `create table network_targets (
      measure text primary key,
      value real not null
    ) strict, without rowid`,
    `create table branch_targets (
      branch_id integer not null references branches (id),
      measure text not null,
      value real not null,
      primary key (branch_id, measure)
    ) strict, without rowid`,
    // One digest of a kind a period and person, whether it had anything to say or not.
    `create table digest_runs (
      kind text not null,
      period text not null,
      at text not null,
      mails integer not null,
      primary key (kind, period)
    ) strict, without rowid`,
    // The signed token of the link that stops mails of its kind; null for mails that always come.
    `alter table mails add column unsubscribe text`,
  );
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
