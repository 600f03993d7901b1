import type { checkAudit } from '#shared/contracts/audit';
import type { OutOf } from '#shared/contracts/endpoint';
import type { AnswerPart } from '../../ui/answer/answer';
import { formatCount, formatExactInstant, formatInstantDay } from '../../ui/format';

export type AuditCheck = OutOf<typeof checkAudit>;

/** The trail in a sentence: what it is, and once its chain was checked, what that found. */
export function auditAnswer(check: AuditCheck | undefined): {
  readonly sentence: readonly AnswerPart[];
  readonly second: readonly AnswerPart[];
} {
  if (!check) {
    return {
      sentence: ['Who did what, when, and from where.'],
      second: [
        'Each event is sealed to the one before it, so that a change or a gap shows; not checked yet.',
      ],
    };
  }
  const checked = `Checked ${formatExactInstant(check.checkedAt)}.`;
  if (check.brokenAt !== null) {
    return {
      sentence: [
        'The chain does not fit from ',
        { figure: `event ${formatCount(check.brokenAt)}` },
        ' on: something there was changed or removed.',
      ],
      second: [
        `${checked} ${formatCount(check.events)} events before it fit. Keep the data folder as it is, ` +
          'and compare it with the newest backup whose own check was good.',
      ],
    };
  }
  const since = check.since === null ? '' : ` since ${formatInstantDay(check.since)}`;
  return {
    sentence: [
      { figure: formatCount(check.events) },
      `${check.events === 1 ? ' event' : ' events'}${since}; the chain fits: nothing was changed or removed.`,
    ],
    second: [checked],
  };
}
