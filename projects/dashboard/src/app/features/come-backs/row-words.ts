import type { ComeBack } from '#shared/contracts/come-back';
import { isStillOpen, keyOfFinding, placeOf, waitWords } from '../../ui/come-back/come-back-words';
import { formatInstant, formatShortDate } from '../../ui/format';
import { ACTION_NAMES, COME_BACK_STATUS_NAMES, CONDITION_NAMES } from '../../ui/words';

/** What the row of a finding says, cell by cell. */
export function rowWords(item: ComeBack, today: string) {
  const { vehicle } = item;
  return {
    item,
    key: keyOfFinding(item),
    car: `${vehicle.make} ${vehicle.model}`,
    year: vehicle.firstRegistered.slice(0, 4),
    link: ['/jobs', item.branch, item.jobRef],
    place: placeOf(item),
    seen: CONDITION_NAMES[item.seenAs],
    worked: item.workedAs && CONDITION_NAMES[item.workedAs],
    left: ACTION_NAMES[item.action],
    since: formatShortDate(item.completedOn),
    wait: waitWords(item.completedOn, today),
    due: item.dueOn ? formatShortDate(item.dueOn) : 'no date',
    late: item.dueOn !== null && item.dueOn < today && isStillOpen(item),
    status: COME_BACK_STATUS_NAMES[item.status],
    told: item.ownerToldOn ? formatShortDate(item.ownerToldOn) : 'not told',
    /** The owner of a dangerous one has to know. */
    untold: item.structural && item.ownerToldOn === null && isStillOpen(item),
    changed:
      item.changedBy && item.changedAt
        ? `${item.changedBy}, ${formatInstant(item.changedAt)}`
        : undefined,
    closedBy: item.closedByJobRef
      ? { jobRef: item.closedByJobRef, link: ['/jobs', item.branch, item.closedByJobRef] }
      : undefined,
  };
}

export type RowWords = ReturnType<typeof rowWords>;
