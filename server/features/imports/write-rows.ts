import { acceptClaim } from '#db/accept-claim';
import { acceptJob } from '#db/accept-job';
import { BranchWriter, type Receipt } from '#db/branch-writer';
import { ClaimWriter } from '#db/claim-writer';
import type { ScopedBranch } from '#db/scope';
import type { Store } from '#db/store';
import type { ImportedFile } from '#shared/contracts/imports';
import { UNCONDITIONAL } from './check-file';
import type { FileRow } from './read-rows';
import type { RefusedRow } from './refused-rows';
import type { RowWorld } from './row-world';
import { takeRow, type RowTaker } from './take-row';

export type Written = ImportedFile['written'];

/** Writes some rows as the API would; those refused only now are given back. Runs inside a write. */
export function writeRows(
  store: Store,
  branch: ScopedBranch,
  rows: readonly FileRow[],
  world: RowWorld,
  receipt: Receipt,
): { written: Written; refused: RefusedRow[] } {
  const written: Written = { created: 0, replaced: 0, unchanged: 0, refused: 0 };
  const refused: RefusedRow[] = [];
  const taker = writingTaker(store, branch, world, receipt);
  for (const row of rows) {
    const taken = takeRow(row.cells, world, taker);
    if ('taken' in taken) {
      written[taken.taken] += 1;
      continue;
    }
    written.refused += 1;
    refused.push({ ...row, problems: taken.problems });
  }
  return { written, refused };
}

function writingTaker(
  store: Store,
  branch: ScopedBranch,
  { sender }: RowWorld,
  receipt: Receipt,
): RowTaker<'created' | 'replaced' | 'unchanged'> {
  const jobs = new BranchWriter(store, branch);
  const claims = new ClaimWriter(store, branch);
  const sending = { ...receipt, money: 'seen', preconditions: UNCONDITIONAL } as const;
  return {
    jobs,
    claims,
    takeJob: (ref, content) => acceptJob(jobs, ref, content, sending).status,
    takeClaim: (ref, content) =>
      acceptClaim(claims, ref, content, { ...receipt, ...sender }).status,
  };
}
