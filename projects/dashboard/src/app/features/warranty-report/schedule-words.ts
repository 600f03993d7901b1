import type { WarrantySchedule } from '#shared/contracts/warranty-reports';
import { addDays } from '#shared/domain/calendar';
import { formatCounted, formatDate, formatInstant } from '../../ui/format';
import { ordinal } from './ordinal';

type Mail = WarrantySchedule['mails'][number];

/** When the report is issued by itself, and when next. */
export function scheduleSentence(schedule: WarrantySchedule): string {
  const { active, dayOfMonth, people, nextOn } = schedule;
  if (!active) return 'No report is issued by itself.';
  const to =
    people.length === 0
      ? 'mailed to nobody'
      : `mailed to ${formatCounted(people.length, 'person', 'people')} of head office`;
  const every = `Issued on the ${ordinal(dayOfMonth)} of every month, as of the last day of the month before, and ${to}.`;
  return nextOn === null
    ? every
    : `${every} Due next on ${formatDate(nextOn)}, as of ${formatDate(dayBeforeMonthOf(nextOn))}.`;
}

/** What the last run did, or that there was none. */
export function lastRunSentence({ lastRun }: WarrantySchedule): string {
  if (!lastRun) return 'It has not run yet.';
  const mails =
    lastRun.mails === 0
      ? 'no mail was written'
      : `${formatCounted(lastRun.mails, 'mail', 'mails')} written`;
  return `Last run ${formatInstant(lastRun.at)}: report ${lastRun.report}, ${mails}.`;
}

/** How a mail stands. */
export function mailStateWords({ state, attempts, sentAt, lastError }: Mail): string {
  const why = lastError ? `: ${lastError}` : '';
  switch (state) {
    case 'sent':
      return sentAt === null ? 'sent' : `sent ${formatInstant(sentAt)}`;
    case 'kept_here':
      return 'kept in the mailbox here, because no mail server is set up';
    case 'given_up':
      return `given up after ${formatCounted(attempts, 'try', 'tries')}${why}`;
    case 'waiting':
      return attempts === 0
        ? 'waits to be sent'
        : `waits for another try after ${formatCounted(attempts, 'try', 'tries')}${why}`;
  }
}

function dayBeforeMonthOf(date: string): string {
  return addDays(`${date.slice(0, 7)}-01`, -1);
}
