import type { IssuedReport } from '#shared/contracts/warranty-reports';
import { issuerWords } from '../issued-words';

const UTC = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
  timeZone: 'UTC',
});

/** What a report on paper is: a numbered one with when and by whom, or a draft. The instant is UTC, the same wherever it is printed. */
export function standingWords(issued: IssuedReport | undefined): string {
  if (!issued) return 'Draft: not issued, without a number';
  const at = UTC.format(new Date(issued.issuedAt)).replace(' at ', ', ');
  return `Report ${issued.id}, issued ${at} UTC by ${issuerWords(issued.by)}`;
}
