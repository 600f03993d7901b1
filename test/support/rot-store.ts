import { putBranchRow, putRegionRow } from '#db/queries/set-up';
import { HEAD_OFFICE, Scope } from '#db/scope';
import type { SentJob } from '#shared/domain/normalise-job';
import { unbilledJob } from './kept-job';
import { SmallStore } from './small-store';

/** Nine branches in three regions. */
export const ROT_PLACES = {
  ...{ AAA: 'COAST', BBB: 'COAST', CCC: 'COAST', DDD: 'HILLS', EEE: 'HILLS', FFF: 'HILLS' },
  ...{ GGG: 'PLAIN', HHH: 'PLAIN', III: 'PLAIN' },
} as const;
export type RotBranch = keyof typeof ROT_PLACES;
export const ROT_BRANCHES = Object.keys(ROT_PLACES) as RotBranch[];

const CLIMATE = { temperatureC: 9, humidityPct: 76, so2Deposition: 4, chlorideDeposition: 3 };

/** A small store with enough branches for figures of the network; COAST has no climate, PLAIN one outside the fitted range. */
export async function makeRotStore(): Promise<SmallStore> {
  const small = await SmallStore.make();
  const { store } = small;
  await store.queue.write(() => {
    const db = store.unscoped;
    putRegionRow(db, { code: 'HILLS', name: 'Hills', climate: CLIMATE });
    putRegionRow(db, { code: 'PLAIN', name: 'Plain', climate: { ...CLIMATE, humidityPct: 20 } });
    for (const code of ROT_BRANCHES) {
      const times = { timeZone: 'Europe/Berlin', openedOn: '2015-01-01', closedOn: null };
      const region = ROT_PLACES[code];
      putBranchRow(db, { ...times, code, name: code, region, targetMarginShare: null });
    }
    store.state.reload();
  });
  return small;
}

/** What head office may see of a store. */
export function headOfficeOf({ store }: SmallStore): Scope {
  return Scope.ofGrant(store.state.branches, HEAD_OFFICE);
}

export type SentFinding = NonNullable<SentJob['findings']>[number];

/** A bubble on the left that was not worked. */
export function found(zone: SentFinding['zone'], over: Partial<SentFinding> = {}): SentFinding {
  return { zone, side: 'left', seenAs: 'bubbling', structural: false, action: 'treated', ...over };
}

/** A car completed on a day, so many whole years after it was registered. */
export function carAged(on: string, years: number, over: Partial<SentJob> = {}): SentJob {
  const firstRegistered = `${Number(on.slice(0, 4)) - years}${on.slice(4, 7)}`;
  const vehicle = { make: 'Vela', model: 'Ono', bodyType: 'van', firstRegistered } as const;
  return { ...unbilledJob(on), vehicle, ...over };
}
