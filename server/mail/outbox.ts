import type { Transporter } from 'nodemailer';
import type { Logger } from 'pino';
import {
  giveUpMail,
  insertMail,
  markMailSent,
  nextDueMail,
  nextMailAt,
  putOffMail,
  type WaitingMail,
} from '#db/queries/mails';
import { wantsMail } from '#db/queries/mail-choices';
import { findPerson } from '#db/queries/people';
import type { Store } from '#db/store';
import { realClock, type Clock } from '../clock';
import type { Config } from '../config';
import {
  importEndedLetter,
  invitationLetter,
  newSignInLetter,
  passwordChangedLetter,
  resetLetter,
  type Addressee,
  type EndedImport,
  type Mail,
  type Occasion,
} from './letters';
import { failureOf, makeTransport, messageOf } from './smtp';

/** How a mail is tried again, in milliseconds: the wait doubles from the first to the longest until the mail is too old. */
export interface Pace {
  firstRetryMs: number;
  longestRetryMs: number;
  giveUpAfterMs: number;
}

const PACE: Pace = {
  firstRetryMs: 30_000,
  longestRetryMs: 6 * 3600_000,
  giveUpAfterMs: 3 * 24 * 3600_000,
};
/** A timer must fit into 32 bits; looking once an hour costs nothing. */
const LONGEST_SLEEP_MS = 3600_000;
/** How long a closing server waits for the mail it is sending. */
const CLOSING_MS = 3000;

/**
 * Keeps mails with the writes they belong to and sends them afterwards, one at a time, when SMTP_URL is set. A mail is sent at
 * least once: after a crash between sending and noting it, it goes out again under the same Message-ID. Without SMTP_URL mails
 * stay in the local mailbox.
 */
export class Outbox {
  private readonly transport: Transporter | undefined;
  private sending: Promise<void> | undefined;
  private timer: NodeJS.Timeout | undefined;
  /** Sent, but a failing database has not noted it: not to be sent again. */
  private readonly unnoted = new Set<number>();
  private state: 'new' | 'started' | 'closed' = 'new';

  constructor(
    private readonly store: Store,
    private readonly config: Pick<Config, 'smtpUrl' | 'publicUrl'>,
    private readonly log: Logger,
    private readonly clock: Clock = realClock,
    private readonly pace: Pace = PACE,
  ) {
    this.transport = config.smtpUrl === undefined ? undefined : makeTransport(config.smtpUrl);
  }

  /** Queues the mail that invites a person to set their first password; inside a write. */
  queueInvitation(to: Addressee, token: string): void {
    this.queue(invitationLetter(to, this.welcomeLink(token, 'invitation')));
  }

  /** Queues the mail that lets a person set a new password; inside a write. */
  queueReset(to: Addressee, token: string): void {
    this.queue(resetLetter(to, this.welcomeLink(token, 'reset')));
  }

  /** Tells a person of a sign-in from a device not seen before, unless they do without; inside a write. */
  queueNewSignIn(personId: number, occasion: Occasion): void {
    const person = findPerson(this.store.unscoped, personId);
    if (!person?.active || !wantsMail(this.store.unscoped, person, 'new_sign_in')) return;
    this.queue(newSignInLetter(person, occasion, this.link('/account')));
  }

  /** Tells a person that their password was changed; inside a write. */
  queuePasswordChanged(personId: number, occasion: Omit<Occasion, 'device'>): void {
    const person = findPerson(this.store.unscoped, personId);
    if (person) this.queue(passwordChangedLetter(person, occasion, this.link('/sign-in')));
  }

  /** Tells a person that a file they sent was worked through, unless they do without; inside a write. */
  queueImportEnded(personId: number, ended: EndedImport): void {
    const person = findPerson(this.store.unscoped, personId);
    if (!person?.active || !wantsMail(this.store.unscoped, person, 'import_ended')) return;
    this.queue(importEndedLetter(person, ended, this.link(ended.path)));
  }

  /** Queues a mail; inside a write, so that it is kept if and only if the rest of the write is. */
  queue(mail: Mail): void {
    const now = this.clock.now().toISOString();
    insertMail(this.store.unscoped, {
      ...mail,
      createdAt: now,
      sendAt: this.transport ? now : null,
    });
    // Fires in a later turn, when the commit is done.
    this.wakeIn(0);
  }

  /** Begins to send what waits, from an earlier run too. */
  start(): void {
    if (this.state !== 'new' || !this.transport) return;
    this.state = 'started';
    this.wakeIn(0);
  }

  /** Stops sending; what still waits is sent after the next start. */
  async close(): Promise<void> {
    this.state = 'closed';
    clearTimeout(this.timer);
    const patience = new Promise<void>((resolve) => setTimeout(resolve, CLOSING_MS).unref());
    await Promise.race([this.sending, patience]);
    this.transport?.close();
  }

  private wakeIn(milliseconds: number): void {
    if (this.state !== 'started' || this.sending) return;
    clearTimeout(this.timer);
    const wait = Math.min(Math.max(milliseconds, 0), LONGEST_SLEEP_MS);
    this.timer = setTimeout(() => {
      this.sending = this.sendDue()
        .catch((error: unknown) => {
          this.log.error(
            { fault: failureOf(error).code },
            'the outbox could not be worked through',
          );
          return this.pace.firstRetryMs;
        })
        .then((next) => {
          this.sending = undefined;
          this.wakeIn(next);
        });
    }, wait).unref();
  }

  /** Sends all that is due, and tells in how many milliseconds the next mail is. */
  private async sendDue(): Promise<number> {
    while (this.state === 'started') {
      const mail = nextDueMail(this.store.unscoped, this.clock.now().toISOString());
      if (!mail) break;
      await this.send(mail);
    }
    // After closing the database may be gone.
    const next = this.state === 'started' ? nextMailAt(this.store.unscoped) : null;
    return next === null ? LONGEST_SLEEP_MS : Date.parse(next) - this.clock.now().getTime();
  }

  private async send(mail: WaitingMail): Promise<void> {
    const db = this.store.unscoped;
    let failure: ReturnType<typeof failureOf> | undefined;
    try {
      if (!this.unnoted.has(mail.id)) await this.transport?.sendMail(messageOf(mail, this.config));
      this.unnoted.add(mail.id);
    } catch (error) {
      failure = failureOf(error);
    }
    const now = this.clock.now();
    await this.store.queue.write(() => {
      if (!failure) markMailSent(db, mail.id, now.toISOString());
      else if (failure.lasting || this.tooOld(mail, now)) giveUpMail(db, mail.id, failure.code);
      else putOffMail(db, mail.id, { error: failure.code, nextAttemptAt: this.next(mail, now) });
    });
    this.unnoted.delete(mail.id);
    if (failure) {
      this.log.warn({ mail: mail.id, failure: failure.code }, 'a mail could not be sent');
    }
  }

  private next(mail: WaitingMail, now: Date): string {
    const { firstRetryMs, longestRetryMs } = this.pace;
    const wait = Math.min(firstRetryMs * 2 ** mail.attempts, longestRetryMs);
    return new Date(now.getTime() + wait).toISOString();
  }

  private tooOld(mail: WaitingMail, now: Date): boolean {
    return now.getTime() - Date.parse(mail.createdAt) > this.pace.giveUpAfterMs;
  }

  private welcomeLink(token: string, purpose: 'invitation' | 'reset'): string {
    return this.link(`/welcome?token=${encodeURIComponent(token)}&purpose=${purpose}`);
  }

  private link(path: string): string {
    return this.config.publicUrl.replace(/\/+$/, '') + path;
  }
}
