import { verifyAudit, type AuditCheck, type NetworkReader } from '#db/queries/audit';
import {
  firstEventAt,
  listAuditNames,
  listAuditRows,
  type AuditFilters,
  type AuditRow,
} from '#db/queries/audit-list';
import type { AuditEvent } from '#shared/contracts/audit';
import { tellEvent } from './tell-event';

/** A page of the trail to read: what to look for, and from below which event on. */
export interface AuditQuestion {
  filters: AuditFilters;
  below: number | null;
  limit: number;
}

export type AuditChain = AuditCheck & { since: string | null };

export interface AuditPage {
  items: AuditEvent[];
  /** The last event told, when there are more. */
  next: number | null;
}

/** Rows that an export takes at a time. */
const PAGE = 500;

/** A page of the trail, newest first. */
export function readAuditPage(
  db: NetworkReader,
  { filters, below, limit }: AuditQuestion,
): AuditPage {
  const rows = listAuditRows(db, filters, below, limit + 1);
  const items = rows.slice(0, limit).map(tellEvent);
  return { items, next: rows.length > limit ? (items.at(-1)?.id ?? null) : null };
}

/** Who and what occurs in the trail. */
export function readAuditNames(db: NetworkReader): { actors: string[]; actions: string[] } {
  return { actors: listAuditNames(db, 'actor'), actions: listAuditNames(db, 'action') };
}

/** Recomputes the chain of the whole trail, and tells when it began. */
export function checkAuditChain(db: NetworkReader): AuditChain {
  return { ...verifyAudit(db), since: firstEventAt(db) };
}

/** Every event that fits, page by page. */
export function* everyEvent(db: NetworkReader, filters: AuditFilters): Generator<AuditRow[]> {
  let below: number | null = null;
  for (;;) {
    const rows: AuditRow[] = listAuditRows(db, filters, below, PAGE);
    if (rows.length === 0) return;
    yield rows;
    below = rows.at(-1)?.id ?? null;
  }
}
