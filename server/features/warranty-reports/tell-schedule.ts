import { findRun, mailsOfRun, readSchedule, type RunMail } from '#db/queries/warranty-schedule';
import type { Store } from '#db/store';
import type { WarrantySchedule } from '#shared/contracts/warranty-reports';
import { nextDue } from './month-due';

/** Before anything was chosen: not active, on the first of the month. */
const UNSET = { active: false, dayOfMonth: 1, people: [], changedAt: null, changedBy: null };

/** The schedule with its last run and how each of that run's mails stands. */
export function tellSchedule({ unscoped }: Store, today: string): WarrantySchedule {
  const schedule = readSchedule(unscoped) ?? UNSET;
  const run = findRun(unscoped);
  const mails = run ? mailsOfRun(unscoped, run.month) : [];
  return {
    ...schedule,
    nextOn: schedule.active ? nextDue(today, schedule.dayOfMonth, run?.month) : null,
    lastRun: run ? { ...run, mails: mails.length } : null,
    mails: mails.map((mail) => ({
      to: mail.to,
      state: stateOf(mail),
      attempts: mail.attempts,
      sentAt: mail.sentAt,
      lastError: mail.lastError,
    })),
  };
}

/** A mail that is not sent and not to be tried lost its text when it was given up; else it stays in the local mailbox. */
function stateOf(mail: RunMail): WarrantySchedule['mails'][number]['state'] {
  if (mail.sentAt !== null) return 'sent';
  if (mail.nextAttemptAt !== null) return 'waiting';
  return mail.hasText ? 'kept_here' : 'given_up';
}
