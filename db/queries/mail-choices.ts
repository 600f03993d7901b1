import { MAIL_KINDS, MAIL_RECEIVERS, type MailKind } from '#shared/domain/mail-kinds';
import type { Role } from '#shared/domain/vocabulary';
import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** A kind of mail that a person can receive, and whether they do. */
export interface MailChoice {
  kind: MailKind;
  wanted: boolean;
}

/** Every kind that the role of a person can receive; one that nothing was said of is wanted. */
export function listMailChoices(db: UnscopedDb, person: { id: number; role: Role }): MailChoice[] {
  const said = new Map(
    db
      .all<{ kind: string; wanted: number }>(
        sql('mail_choices').where({ person_id: person.id }).select('kind', 'wanted'),
      )
      .map(({ kind, wanted }) => [kind, wanted === 1]),
  );
  return MAIL_KINDS.filter((kind) => MAIL_RECEIVERS[kind].includes(person.role)).map((kind) => ({
    kind,
    wanted: said.get(kind) ?? true,
  }));
}

/** Whether a person gets a kind of mail. */
export function wantsMail(
  db: UnscopedDb,
  person: { id: number; role: Role },
  kind: MailKind,
): boolean {
  return listMailChoices(db, person).some((choice) => choice.kind === kind && choice.wanted);
}

/** Keeps what a person said of a kind of mail; inside a write. */
export function keepMailChoice(db: UnscopedDb, personId: number, choice: MailChoice): void {
  const key = { person_id: personId, kind: choice.kind };
  db.run(sql('mail_choices').where(key).delete());
  db.run(sql('mail_choices').insert({ ...key, wanted: choice.wanted ? 1 : 0 }));
}
