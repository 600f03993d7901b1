import type { UnderWayRow } from '#db/queries/under-way';
import type { JobDraft, JobUnderWay } from '#shared/contracts/under-way';
import { withoutMoney } from '#shared/domain/without-money';

/** A job under way as answered; to a recorder without any amount but the price quoted (rule 24). */
export function tellUnderWay(
  branch: string,
  { text, ...row }: UnderWayRow,
  money: 'seen' | 'unseen',
): JobUnderWay {
  const content = JSON.parse(text) as JobDraft;
  return { branch, ...row, content: money === 'seen' ? content : seenByRecorder(content) };
}

/** A bill of which only the total is written down is not begun for one who does not see the total. */
function seenByRecorder(content: JobDraft): JobDraft {
  const { invoice, ...rest } = withoutMoney(content);
  return Object.keys(invoice ?? {}).length > 0 ? { ...rest, invoice } : rest;
}
