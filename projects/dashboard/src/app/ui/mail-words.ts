import type { MailKind } from '#shared/domain/mail-kinds';

/** A mail that one may do without, and what it is good for. */
export const MAIL_WORDS: Readonly<
  Record<MailKind, { readonly name: string; readonly why: string }>
> = {
  new_sign_in: {
    name: 'A new sign-in as you',
    why: 'When and on what kind of device, so that you notice one that was not you.',
  },
  import_ended: {
    name: 'A file of yours has been imported',
    why: 'How many rows were written and how many were refused, when you did not wait for the end.',
  },
  warranty_report: {
    name: 'The warranty report of the month has been issued',
    why: 'A link to it, for those whom head office has chosen to be told.',
  },
  monday_digest: {
    name: 'Monday: your week in three sentences',
    why: 'What last week kept, what stood out, and what waits for you. Nothing is sent when there is nothing to say.',
  },
  region_digest: {
    name: 'Monday: what changed in your regions',
    why: 'Signals that are new or over, and branches that send nothing. Nothing is sent when nothing changed.',
  },
  month_digest: {
    name: 'The network in the month that ended',
    why: 'What changed, branch by branch, on the first of the month.',
  },
};
