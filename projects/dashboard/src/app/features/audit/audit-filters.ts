import { isDate } from '#shared/domain/calendar';
import { formatDate, formatDateRange } from '../../ui/format';
import { ACTION_KINDS, actionWords } from './action-words';

/** What the trail is narrowed to, as the URL has it. */
export interface AuditFilters {
  readonly from: string | undefined;
  readonly to: string | undefined;
  readonly actor: string | undefined;
  readonly action: string | undefined;
  readonly subject: string | undefined;
  readonly branch: string | undefined;
}

/** Takes from the URL what makes sense; an empty or mistyped part is none. */
export function auditFilters(url: {
  readonly [Name in keyof AuditFilters]: string | undefined;
}): AuditFilters {
  const day = (text: string | undefined): string | undefined =>
    text !== undefined && isDate(text) ? text : undefined;
  const from = day(url.from);
  const to = day(url.to);
  const ordered = from === undefined || to === undefined || from <= to;
  return {
    from: ordered ? from : undefined,
    to: ordered ? to : undefined,
    actor: url.actor || undefined,
    action: url.action || undefined,
    subject: url.subject || undefined,
    branch: url.branch || undefined,
  };
}

/** The dates, in words. */
export function datesWords({ from, to }: Pick<AuditFilters, 'from' | 'to'>): string {
  if (from && to) return from === to ? formatDate(from) : formatDateRange(from, to);
  if (from) return `since ${formatDate(from)}`;
  return to ? `until ${formatDate(to)}` : 'all dates';
}

/** What was done, in words: a kind of action or a single one. */
export function doneWords(action: string | undefined): string {
  if (action === undefined) return 'whatever was done';
  return ACTION_KINDS.find(({ value }) => value === action)?.words ?? actionWords(action);
}

/** Whether anything narrows the trail. */
export function isNarrowed(filters: AuditFilters): boolean {
  return Object.values(filters).some((part) => part !== undefined);
}
