import type { ComeBack, listComeBack } from '#shared/contracts/come-back';
import type { OutOf } from '#shared/contracts/endpoint';

/** A load-bearing bubble in the left inner sill of a hatchback, deferred on 3 November, unless said. */
export function comeBackRow(jobRef: string, more: Partial<ComeBack> = {}): ComeBack {
  return {
    branch: 'HAV',
    jobRef,
    ref: 'sill_inner/left/1',
    vehicle: {
      key: 'K-17',
      make: 'Velder',
      model: 'Tessock',
      bodyType: 'hatchback',
      firstRegistered: '2009-05',
    },
    zone: 'sill_inner',
    side: 'left',
    seenAs: 'bubbling',
    workedAs: null,
    structural: true,
    action: 'deferred',
    completedOn: '2025-11-03',
    status: 'open',
    dueOn: null,
    note: '',
    ownerToldOn: null,
    changedBy: null,
    changedAt: null,
    closedByJobRef: null,
    ...more,
  };
}

/** A whole list as the API answers it, its counts taken from the items unless said. */
export function comeBackList(
  items: readonly ComeBack[],
  more: Partial<OutOf<typeof listComeBack>> = {},
): OutOf<typeof listComeBack> {
  const dangerous = items.filter(({ structural }) => structural);
  return {
    items: [...items],
    nextCursor: null,
    findings: items.length,
    dangerous: dangerous.length,
    dangerousNotTold: dangerous.filter(({ ownerToldOn }) => ownerToldOn === null).length,
    cars: new Set(items.map(({ branch, jobRef }) => `${branch} ${jobRef}`)).size,
    ...more,
  };
}
