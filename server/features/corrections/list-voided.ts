import { listVoidedRows, type VoidedPlace, type VoidedRow } from '#db/queries/corrections';
import type { ScopedDb } from '#db/scoped-db';
import type { listVoidedJobs } from '#shared/contracts/corrections';
import type { OutOf } from '#shared/contracts/endpoint';

type VoidedJob = OutOf<typeof listVoidedJobs>['items'][number];

/** A page of the list of voided jobs. */
export interface VoidedPage {
  items: VoidedJob[];
  /** Where it ended, when there are more. */
  next: VoidedPlace | null;
}

/** A page of a branch's voided jobs, the last voided first. */
export function listVoided(
  db: ScopedDb,
  branch: string,
  { after, limit }: { after: VoidedPlace | null; limit: number },
): VoidedPage {
  const rows = listVoidedRows(db, branch, after, limit + 1);
  const page = rows.slice(0, limit);
  const last = page.at(-1);
  const next = rows.length > limit && last ? { voidedAt: last.voidedAt, id: last.id } : null;
  return { items: page.map(told), next };
}

function told({ id: _id, content, ...row }: VoidedRow): VoidedJob {
  const { make, model, firstRegistered } = content.vehicle;
  const { package: packageCode, completedOn } = content;
  return { ...row, make, model, firstRegistered, package: packageCode, completedOn };
}
