import { sql } from '../database';
import type { UnscopedDb } from '../unscoped-db';

/** A mail that waits to be sent. */
export interface WaitingMail {
  id: number;
  recipient: string;
  subject: string;
  text: string;
  html: string | null;
  createdAt: string;
  /** Token of the link that stops mails of its kind; null for mails that always come. */
  unsubscribe: string | null;
  /** Attempts that failed so far. */
  attempts: number;
}

/** A mail kept here to be read in the local mailbox. */
export interface KeptMail {
  id: number;
  to: string;
  subject: string;
  createdAt: string;
  text: string;
}

/** Keeps a mail; with `sendAt` it waits to be sent from then on, with null it stays in the local mailbox. */
export function insertMail(
  db: UnscopedDb,
  mail: {
    to: string;
    subject: string;
    text: string;
    html: string;
    createdAt: string;
    sendAt: string | null;
    /** Month of the run of the warranty report that it belongs to. */
    reportRun?: string;
    /** Token of the link that stops mails of its kind. */
    unsubscribe?: string;
  },
): void {
  db.run(
    sql('mails').insert({
      recipient: mail.to,
      subject: mail.subject,
      text_body: mail.text,
      html_body: mail.html,
      created_at: mail.createdAt,
      next_attempt_at: mail.sendAt,
      report_run: mail.reportRun ?? null,
      unsubscribe: mail.unsubscribe ?? null,
    }),
  );
}

/** The newest mails that nothing has sent. */
export function keptMails(db: UnscopedDb, limit: number): KeptMail[] {
  return db.all<KeptMail>(
    sql('mails')
      .whereNull('sent_at')
      .whereNot({ text_body: '' })
      .orderBy('id', 'desc')
      .limit(limit)
      .select('id', 'subject', { to: 'recipient', text: 'text_body', createdAt: 'created_at' }),
  );
}

/** The mail whose turn it is. */
export function nextDueMail(db: UnscopedDb, now: string): WaitingMail | undefined {
  return db.first<WaitingMail>(
    sql('mails')
      .whereNull('sent_at')
      .where('next_attempt_at', '<=', now)
      .orderBy(['next_attempt_at', 'id'])
      .limit(1)
      .select('id', 'recipient', 'subject', 'attempts', 'unsubscribe', {
        text: 'text_body',
        html: 'html_body',
        createdAt: 'created_at',
      }),
  );
}

/** When the next mail that waits is due, or null when none waits. */
export function nextMailAt(db: UnscopedDb): string | null {
  const row = db.first<{ at: string | null }>(
    sql('mails').whereNull('sent_at').min({ at: 'next_attempt_at' }),
  );
  return row?.at ?? null;
}

/** Notes that a mail is about to be handed over whole: whatever happens then, the mail server may have it. */
export function markHandedOver(db: UnscopedDb, id: number, at: string): void {
  db.run(sql('mails').where({ id }).update({ handed_over_at: at }));
}

/** Takes mails that an earlier run handed over, and did not live to hear the answer of, as sent. */
export function settleHandedOver(db: UnscopedDb): void {
  db.run(
    sql('mails')
      .whereNull('sent_at')
      .whereNotNull('next_attempt_at')
      .whereNotNull('handed_over_at')
      .increment('attempts', 1)
      .update({
        sent_at: sql.ref('handed_over_at'),
        next_attempt_at: null,
        last_error: UNANSWERED,
        ...FORGOTTEN,
      }),
  );
}

/** What stands beside a mail that was handed over whole, while the server's answer was lost in a stop. */
const UNANSWERED = 'ANSWER LOST IN A STOP';

/** What is forgotten of a mail that is done with: the links in its text sign somebody in or stop their mail. */
const FORGOTTEN = { text_body: '', html_body: null, unsubscribe: null };

/** Marks a mail as sent and forgets its text. */
export function markMailSent(db: UnscopedDb, id: number, at: string): void {
  db.run(
    sql('mails')
      .where({ id })
      .increment('attempts', 1)
      .update({ sent_at: at, next_attempt_at: null, ...FORGOTTEN }),
  );
}

/** Notes a failed attempt and when the next is due. */
export function putOffMail(
  db: UnscopedDb,
  id: number,
  failure: { error: string; nextAttemptAt: string },
): void {
  db.run(
    sql('mails').where({ id }).increment('attempts', 1).update({
      next_attempt_at: failure.nextAttemptAt,
      last_error: failure.error,
      handed_over_at: null,
    }),
  );
}

/** Gives a mail up; its envelope stays as a record, its text does not. */
export function giveUpMail(db: UnscopedDb, id: number, error: string): void {
  db.run(
    sql('mails')
      .where({ id })
      .increment('attempts', 1)
      .update({ next_attempt_at: null, last_error: error, ...FORGOTTEN }),
  );
}
