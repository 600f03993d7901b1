import type { Transporter } from 'nodemailer';
import type { Logger } from 'pino';
import {
  giveUpMail,
  insertMail,
  markHandedOver,
  markMailSent,
  nextDueMail,
  nextMailAt,
  putOffMail,
  settleHandedOver,
  type WaitingMail,
} from '#db/queries/mails';
import { wantsMail } from '#db/queries/mail-choices';
import { findPerson } from '#db/queries/people';
import type { Store } from '#db/store';
import { realClock, type Clock } from '../clock';
import type { Config } from '../config';
import type { Digest } from '../features/digests/digest';
import {
  importEndedLetter,
  invitationLetter,
  newSignInLetter,
  passwordChangedLetter,
  resetLetter,
  warrantyReportLetter,
  type Addressee,
  type EndedImport,
  type Mail,
  type Occasion,
} from './letters';
import { digestLetter } from './digest-letters';
import { failureOf, makeTransport, messageOf, stopLink } from './smtp';

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

/** What a mail of a run of the warranty report tells of. */
export interface IssuedInRun {
  /** `2026-02` */
  month: string;
  report: number;
  asOf: string;
}

/**
 * Keeps mails with the writes they belong to and sends them afterwards, one at a time, when SMTP_URL is set; without it they
 * stay in the local mailbox.
 *
 * A mail is sent once, whenever this process ends. SMTP has no way to ask whether a mail was taken (RFC 1047), so the moment
 * from which it may have been is noted on disk just before the line that ends the mail leaves: a start that finds no such note
 * sends the mail, for no server can have taken it; one that finds it takes the mail as sent and says that the answer was lost.
 * Between note and last bytes lies only handing them to the operating system, which delivers them even if the process is killed.
 * While the process lives it does hear the answer: a refusal, or a connection lost before one, means another try under the
 * same Message-ID (RFC 5321, 4.5.4.1).
 */
export class Outbox {
  private readonly transport: Transporter | undefined;
  private sending: Promise<void> | undefined;
  private timer: NodeJS.Timeout | undefined;
  /** Sent, but a failing database has not noted it: not to be sent again. */
  private readonly unnoted = new Set<number>();
  /** Whether what an earlier run handed over has been settled. */
  private settled = false;
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

  /** Tells somebody of head office that the report of a month was issued, unless they do without; inside a write. */
  queueWarrantyReport(personId: number, { month, report, asOf }: IssuedInRun): void {
    const person = findPerson(this.store.unscoped, personId);
    if (!person?.active || !wantsMail(this.store.unscoped, person, 'warranty_report')) return;
    const link = this.link(`/warranty/reports/${report}`);
    this.queue(warrantyReportLetter(person, asOf, link), { reportRun: month });
  }

  /** Queues a digest with the link that stops its kind; inside a write, which has found that the person wants it. */
  queueDigest(to: Addressee, digest: Digest, unsubscribe: string): void {
    const stop = stopLink(this.config.publicUrl, unsubscribe);
    const page = (path: string): string => this.link(path);
    this.queue(digestLetter(to, digest, { page, stop }), { unsubscribe });
  }

  /** Queues a mail; inside a write, so that it is kept if and only if the rest of the write is. */
  queue(mail: Mail, kept: { reportRun?: string; unsubscribe?: string } = {}): void {
    const now = this.clock.now().toISOString();
    insertMail(this.store.unscoped, {
      ...mail,
      createdAt: now,
      sendAt: this.transport ? now : null,
      ...kept,
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
    // Before anything is sent: only an earlier run can have left a mail handed over.
    if (!this.settled) await this.store.queue.write(() => settleHandedOver(this.store.unscoped));
    this.settled = true;
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
      if (!this.unnoted.has(mail.id)) await this.transport?.sendMail(this.messageOf(mail));
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

  private messageOf(mail: WaitingMail): ReturnType<typeof messageOf> {
    return messageOf(mail, this.config, () =>
      this.store.queue.write(() =>
        markHandedOver(this.store.unscoped, mail.id, this.clock.now().toISOString()),
      ),
    );
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
