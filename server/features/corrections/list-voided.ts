import { listVoidedRows, type VoidedRow } from '#db/queries/corrections';
import type { ScopedDb } from '#db/scoped-db';
import type { listVoidedJobs } from '#shared/contracts/corrections';
import type { OutOf } from '#shared/contracts/endpoint';
import { cursorOf, placeOf } from './voided-cursor';

type VoidedPage = OutOf<typeof listVoidedJobs>;

/** A page of a branch's voided jobs, the last voided first. */
export function listVoided(
  db: ScopedDb,
  branch: string,
  { limit, cursor }: { limit: number; cursor?: string | undefined },
): VoidedPage {
  const rows = listVoidedRows(db, branch, placeOf(cursor), limit + 1);
  const page = rows.slice(0, limit);
  const last = page.at(-1);
  return {
    items: page.map(told),
    nextCursor: rows.length > limit && last ? cursorOf(last) : null,
  };
}

function told({ id: _id, content, ...row }: VoidedRow): VoidedPage['items'][number] {
  const { make, model, firstRegistered } = content.vehicle;
  const { package: packageCode, completedOn } = content;
  return { ...row, make, model, firstRegistered, package: packageCode, completedOn };
}
