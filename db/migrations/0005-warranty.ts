import type { Knex } from 'knex';
import { appendOnly, neverReplaced } from './append-only';

/** A text of the trail about the claim of a revision of `claim_revisions`, one that names that revision. */
const TOLD_OF_REVISION = `from audit_events e
  join claims c on c.id = claim_revisions.claim_id
  join branches b on b.id = c.branch_id
  where e.subject = '/branches/' || b.code || '/claims/' || c.claim_ref collate nocase
    and e.subject = '/branches/' || b.code || '/claims/' || c.claim_ref
    and e.action in ('claim.make', 'claim.correct')
    and json_extract(e.detail, '$.revision') = claim_revisions.revision
  order by e.id desc limit 1`;

/** Photos of claims, what each revision of a claim decided, issued warranty reports, and the schedule that issues them. */
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
    // Noted before the last byte of a mail leaves: from then on the mail server may have taken it.
    `alter table mails add column handed_over_at text`,
    `alter table claims add column side text`,
    // Of the reference: what a search looks into, without regard to case.
    `alter table claims add column search_text text not null default ''`,
    // What counted from a revision on: what it says itself may have been a proposal only (rule 77).
    `alter table claim_revisions add column decision text not null default 'open'`,
    `alter table claim_revisions add column proposed_decision text`,
    'drop trigger claim_revisions_no_update',
    `update claim_revisions set
      decision = coalesce((select json_extract(e.detail, '$.decision') ${TOLD_OF_REVISION}),
        json_extract(content, '$.decision')),
      proposed_decision = (select json_extract(e.detail, '$.proposed') ${TOLD_OF_REVISION})`,
    appendOnly('claim_revisions', 'update'),
    // A decision that waits has no day yet.
    `update claims set decided_on = null where decision = 'open'`,
    `create index claims_by_branch_day on claims (branch_id, made_on)`,
    `create index claim_revisions_received on claim_revisions (received_at)`,
  );
  await fillSearchTexts(knex);
}

async function fillSearchTexts(knex: Knex): Promise<void> {
  const claims: { id: number; claim_ref: string }[] = await knex('claims').select(
    'id',
    'claim_ref',
  );
  for (const { id, claim_ref } of claims) {
    await knex('claims')
      .where({ id })
      .update({ search_text: folded(claim_ref) });
  }
}

/** As the record folds a text with this migration. */
function folded(text: string): string {
  return text.normalize('NFC').trim().replace(/\s+/gu, ' ').toLowerCase();
}

/** Migrations only go forward. */
export async function down(): Promise<void> {
  throw new Error('Underseam migrations only go forward; restore a backup instead.');
}

async function run(knex: Knex, ...statements: string[]): Promise<void> {
  for (const statement of statements) await knex.raw(statement);
}
