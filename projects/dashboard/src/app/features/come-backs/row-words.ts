import type { ComeBack } from '#shared/contracts/come-back';
import { isDangerous } from '#shared/domain/danger';
import { isStillOpen, keyOfFinding, placeOf, waitWords } from '../../ui/come-back/come-back-words';
import { formatInstantDay, formatShortDate } from '../../ui/format';
import { COME_BACK_STATUS_NAMES, CONDITION_NAMES } from '../../ui/words';

/** What the row of a finding says, cell by cell. */
export function rowWords(item: ComeBack, today: string, branchName?: string) {
  const { vehicle } = item;
  return {
    item,
    key: keyOfFinding(item),
    car: `${vehicle.make} ${vehicle.model}`,
    about: [
      `job ${item.jobRef}`,
      ...(vehicle.key ? [`car ${vehicle.key}`] : []),
      ...(branchName ? [branchName] : []),
    ].join(', '),
    year: vehicle.firstRegistered.slice(0, 4),
    link: ['/jobs', item.branch, item.jobRef],
    place: placeOf(item),
    seen: CONDITION_NAMES[item.seenAs],
    worked: item.workedAs && CONDITION_NAMES[item.workedAs],
    /** Short: the column is narrow, and who declined is plain here. */
    left: item.action,
    since: formatShortDate(item.completedOn),
    wait: waitWords(item.completedOn, today),
    due: item.dueOn ? formatShortDate(item.dueOn) : 'no date',
    late: item.dueOn !== null && item.dueOn < today && isStillOpen(item),
    status: COME_BACK_STATUS_NAMES[item.status],
    told: item.ownerToldOn ? formatShortDate(item.ownerToldOn) : 'not told',
    /** The owner of a dangerous one has to know. */
    dangerous: isDangerous(item),
    /** What stands where danger would. */
    harmless: item.structural ? 'surface rust' : 'not load-bearing',
    untold: isDangerous(item) && item.ownerToldOn === null && isStillOpen(item),
    changed:
      item.changedBy && item.changedAt
        ? `${item.changedBy}, ${formatInstantDay(item.changedAt)}`
        : undefined,
    closedBy: item.closedByJobRef
      ? { jobRef: item.closedByJobRef, link: ['/jobs', item.branch, item.closedByJobRef] }
      : undefined,
  };
}

export type RowWords = ReturnType<typeof rowWords>;
