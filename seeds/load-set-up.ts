import { writeNetwork } from '#db/queries/network';
import {
  putBranchRow,
  putCost,
  putPackageRow,
  putProductRow,
  putRegionRow,
} from '#db/queries/set-up';
import type { UnscopedDb } from '#db/unscoped-db';
import { costChangesOf } from './demo-costs';
import type { DemoSetUp } from './demo-network';

/** Writes what head office sets up: network, regions, branches, catalogue, dated costs and norms. Runs inside a write. */
export function loadSetUp(db: UnscopedDb, setUp: DemoSetUp): void {
  const { name, currency, targetMarginShare, claimLimitCents } = setUp.network;
  writeNetwork(db, { name, currency, targetMarginShare, claimLimitCents });
  for (const region of setUp.regions) putRegionRow(db, region);
  for (const { targetMarginShare: target = null, ...branch } of setUp.branches) {
    putBranchRow(db, { ...branch, closedOn: null, targetMarginShare: target });
  }
  for (const product of setUp.products) putProductRow(db, product);
  for (const entry of setUp.packages) putPackageRow(db, entry);
  for (const change of costChangesOf(setUp)) putCost(db, change);
}
