import { recordAudit, type Deed } from '#db/queries/audit';
import {
  deleteCatalogueRow,
  isNamedSince,
  type CatalogueRow,
  type Referrers,
} from '#db/queries/referrers';
import type { Store } from '#db/store';
import { Refusal } from '#shared/domain/refusal';

/**
 * Takes a product or a package out of the catalogue that nothing refers to; `referrers` were counted before. Refuses with what
 * does, so that no record and no figure ever names what is gone.
 */
export async function takeOut(
  store: Store,
  row: CatalogueRow,
  referrers: Referrers,
  before: unknown,
  { actor, at, subject }: Deed,
): Promise<void> {
  const told = tellReferrers(referrers);
  if (told !== undefined) throw inUse(row, told);
  await store.queue.write(() => {
    const db = store.unscoped;
    // What came between the counting and this write is looked at here.
    if (isNamedSince(db, row, referrers.lastRevision)) throw inUse(row, '1 job refers');
    if (!deleteCatalogueRow(db, row)) throw inUse(row, 'something refers');
    const detail = { before, after: null };
    const action = `${row.kind}.remove`;
    recordAudit(db, { at, actor, action, subject, branchId: null, detail });
    store.state.reload();
  });
}

/** What refers to it, in words: `12 jobs and 3 norms refer`; `undefined` when nothing does. */
export function tellReferrers(referrers: Referrers): string | undefined {
  const counts = [
    [referrers.jobs, 'job', 'jobs'],
    [referrers.underWay, 'car under way', 'cars under way'],
    [referrers.bookings, 'booking', 'bookings'],
    [referrers.norms, 'norm', 'norms'],
    [referrers.costs, 'dated cost', 'dated costs'],
  ] as const;
  const named = counts.flatMap(([n, one, many]) =>
    n === 0 ? [] : [`${n.toLocaleString('en')} ${n === 1 ? one : many}`],
  );
  if (named.length === 0) return undefined;
  const last = named.pop() ?? '';
  const list = named.length === 0 ? last : `${named.join(', ')} and ${last}`;
  const single = named.length === 0 && last.startsWith('1 ');
  return `${list} ${single ? 'refers' : 'refer'}`;
}

function inUse({ kind, code }: CatalogueRow, told: string): Refusal {
  return new Refusal('conflict', `The ${kind} ${code} stays: ${told} to it.`);
}
