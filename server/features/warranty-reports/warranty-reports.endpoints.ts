import { recordAudit } from '#db/queries/audit';
import { findReport, listReports, readReportPart } from '#db/queries/warranty-reports';
import type { Scope } from '#db/scope';
import * as contracts from '#shared/contracts/warranty-reports';
import type { WarrantyReport } from '#shared/contracts/warranty-reports';
import { notFound, refuseInput } from '#shared/domain/refusal';
import { actorOf } from '../../auth/caller';
import { realClock, todayIn } from '../../clock';
import { cursorOf, placeOf } from '../../http/list-cursor';
import { mount, type Call, type Mounting } from '../../http/mount';
import type { Kit } from '../../kit';
import { beginReport, keepReport } from './issue-report';
import { reportNumber } from './report-number';
import { reportPlace } from './report-place';
import { mountSchedule } from './schedule.endpoints';
import { tellReport } from './tell-report';

/** Most of what arrived later that is told; all of it is counted. */
const MOST_LATER = 200;

/** The warranty-risk report: made as of a day, issued and kept, and the schedule that issues it. */
export function mountWarrantyReports(mounting: Mounting, kit: Kit): void {
  const { reads, store } = kit;

  mount(mounting, contracts.getWarrantyReport, async ({ scope, query }) => {
    const asOf = dayAsked(kit, scope, query.asOf, '/query/asOf');
    return { body: await reads.answer('warrantyReport', scope, { asOf }) };
  });

  mount(mounting, contracts.getWarrantyReportPdf, async (call) => {
    const asOf = dayAsked(kit, call.scope, call.query.asOf, '/query/asOf');
    const pdf = await reads.answer('warrantyReportPdf', call.scope, { asOf });
    await fetched(kit, call, '/warranty-report/pdf', { asOf });
    return {
      body: Buffer.from(pdf),
      headers: attachment(`underseam-warranty-risk-${asOf}.pdf`),
    };
  });

  mount(mounting, contracts.issueWarrantyReport, async (call) => {
    const asOf = dayAsked(kit, call.scope, call.body.asOf, '/asOf');
    const begun = beginReport(store, realClock.now().toISOString());
    const parts = await reads.answer('warrantyReportParts', call.scope, { asOf });
    const actor = actorOf(call.caller, call.address);
    const id = await store.queue.write(() => keepReport(store, { ...parts, begun }, actor));
    return { body: tellReport(reportOf(kit, String(id))) };
  });

  mount(mounting, contracts.listWarrantyReports, ({ query }) => {
    const below = placeOf(query.cursor, reportPlace)?.report ?? null;
    const rows = listReports(store.unscoped, below, query.limit + 1);
    const items = rows.slice(0, query.limit).map(tellReport);
    const last = rows.length > query.limit ? items.at(-1) : undefined;
    return { body: { items, nextCursor: last ? cursorOf({ report: last.id }) : null } };
  });

  const exists = ({ params }: { params: { id: string } }): boolean => {
    const number = reportNumber(params.id);
    return number !== undefined && findReport(store.unscoped, number) !== undefined;
  };

  mount(
    mounting,
    contracts.getIssuedReport,
    async ({ scope, params }) => {
      const row = reportOf(kit, params.id);
      const { asOf, summary } = row;
      const [later, now] = await Promise.all([
        reads.answer('laterArrivals', scope, {
          asOf,
          received: summary.received,
          limit: MOST_LATER,
        }),
        reads.answer('warranty', scope, { asOf, filters: {}, groupBy: 'package' }),
      ]);
      const { outstandingCents, standardErrorCents } = now.total;
      return {
        body: {
          issued: tellReport(row),
          report: JSON.parse(partOf(kit, row.id, 'report')) as WarrantyReport,
          later: later.items,
          laterCount: later.count,
          now: {
            covered: now.covered,
            claims: now.rate.claims,
            outstandingCents,
            standardErrorCents,
          },
        },
      };
    },
    { exists },
  );

  mount(
    mounting,
    contracts.getIssuedReportPdf,
    async (call) => {
      const { id, asOf } = reportOf(kit, call.params.id);
      await fetched(kit, call, `/warranty-reports/${id}/pdf`, { asOf });
      return {
        body: partOf(kit, id, 'pdf'),
        headers: attachment(`underseam-warranty-risk-${asOf}-report-${id}.pdf`),
      };
    },
    { exists },
  );

  mount(
    mounting,
    contracts.getIssuedReportCsv,
    async (call) => {
      const { id, asOf } = reportOf(kit, call.params.id);
      await fetched(kit, call, `/warranty-reports/${id}/csv`, { asOf });
      return {
        body: partOf(kit, id, 'csv'),
        headers: attachment(`underseam-warranty-risk-${asOf}-report-${id}.csv`),
      };
    },
    { exists },
  );

  mountSchedule(mounting, kit);
}

/** The day a report is asked as of: today unless said, never a later one. */
function dayAsked(kit: Kit, scope: Scope, asOf: string | undefined, path: string): string {
  const today = todayIn(scope, kit.clock);
  if (asOf !== undefined && asOf > today) {
    throw refuseInput([{ path, message: `is after today (${today})` }]);
  }
  return asOf ?? today;
}

function reportOf({ store }: Kit, id: string) {
  const row = findReport(store.unscoped, reportNumber(id) ?? 0);
  if (!row) throw notFound();
  return row;
}

function partOf<Part extends 'report' | 'csv' | 'pdf'>({ store }: Kit, id: number, part: Part) {
  const found = readReportPart(store.unscoped, id, part);
  if (found === undefined) throw notFound();
  return found;
}

/** A report that leaves as a file is in the trail before its first byte, like every export. */
async function fetched(
  { store }: Kit,
  call: Pick<Call, 'caller' | 'address'>,
  subject: string,
  detail: { asOf: string },
): Promise<void> {
  await store.queue.write(() =>
    recordAudit(store.unscoped, {
      at: realClock.now().toISOString(),
      actor: actorOf(call.caller, call.address),
      action: 'export.warranty-report',
      subject,
      branchId: null,
      detail,
    }),
  );
}

function attachment(name: string): Record<string, string> {
  return { 'Content-Disposition': `attachment; filename="${name}"` };
}
