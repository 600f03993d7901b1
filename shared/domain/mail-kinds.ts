import type { Role } from './vocabulary';

/** Mails that a person may do without. Invitations and links for a new password always come. */
export const MAIL_KINDS = [
  'new_sign_in',
  'import_ended',
  'warranty_report',
  'monday_digest',
  'region_digest',
  'month_digest',
] as const;
export type MailKind = (typeof MAIL_KINDS)[number];

/** Who can receive a kind at all; everybody who can does until they say otherwise. */
export const MAIL_RECEIVERS: Readonly<Record<MailKind, readonly Role[]>> = {
  new_sign_in: ['recorder', 'site_manager', 'regional_lead', 'head_office'],
  import_ended: ['site_manager', 'head_office'],
  warranty_report: ['head_office'],
  monday_digest: ['site_manager'],
  region_digest: ['regional_lead'],
  month_digest: ['head_office'],
};
