import {
  putCost,
  putBranchRow,
  putPackageRow,
  putProductRow,
  putRegionRow,
} from '#db/queries/set-up';
import { writeNetwork } from '#db/queries/network';
import type { Store } from '#db/store';
import { FROM_THE_START } from '#shared/domain/cost-book';

/** Branch codes of the bench network. */
export function branchCodes(count: number): string[] {
  return Array.from({ length: count }, (_, index) => `B${String(index).padStart(3, '0')}`);
}

/** Sets up a network of so many branches, with every cost and one norm. */
export async function setUpBench(store: Store, branches: number): Promise<void> {
  await store.queue.write(() => {
    const db = store.unscoped;
    writeNetwork(db, {
      name: 'Bench',
      currency: 'EUR',
      targetMarginShare: null,
      claimLimitCents: null,
    });
    putCost(db, { kind: 'fee', from: FROM_THE_START, value: 50_000 });
    for (const code of ['NORTH', 'SOUTH']) putRegionRow(db, { code, name: code, climate: null });
    for (const [index, code] of branchCodes(branches).entries()) {
      putBranchRow(db, {
        code,
        name: code,
        region: index % 2 === 0 ? 'NORTH' : 'SOUTH',
        timeZone: 'UTC',
        openedOn: '2000-01-01',
        closedOn: null,
        targetMarginShare: null,
      });
      putCost(db, { kind: 'hourlyCost', code, from: '2000-01-01', value: 3_600 });
    }
    putPackageRow(db, { code: 'full', name: 'Full', warrantyMonths: 36 });
    const kinds = { CW1: 'cavity_wax', UW1: 'underbody_wax', SC1: 'stone_chip' } as const;
    for (const [code, kind] of Object.entries(kinds)) {
      putProductRow(db, { code, name: code, kind });
      putCost(db, { kind: 'product', code, from: '2000-01-01', value: 1_200 });
    }
    putCost(db, {
      kind: 'norm',
      package: 'full',
      bodyType: 'hatchback',
      lines: [
        { product: 'CW1', ml: 4_000 },
        { product: 'UW1', ml: 4_000 },
        { product: 'SC1', ml: 1_500 },
      ],
    });
    store.state.reload();
  });
}
