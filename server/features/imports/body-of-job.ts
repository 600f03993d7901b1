import type { RecordedJob } from '#shared/domain/recorded-job';
import { CHECKS, STAGES } from '#shared/domain/vocabulary';
import { fillConsumables } from './fill-consumables';
import { fillFindings } from './fill-findings';
import { fillProducts } from './fill-products';
import type { ReadRow } from './read-row';
import { RowBody } from './row-body';

/**
 * The job that a row says: what the file has a column for as its cells say, everything else as it is stored, so that a file of
 * corrections takes nothing away that it does not speak of.
 */
export function bodyOfJob(row: ReadRow, stored: RecordedJob | undefined): RowBody {
  const draft = new RowBody(row, stored);
  const { body } = draft;
  draft.fill('package', 'bookedOn', 'startedOn', 'completedOn', 'boughtInCents', 'notes');
  const keys = ['key', 'make', 'model', 'bodyType', 'firstRegistered', 'odometerKm'];
  body['vehicle'] = draft.fillPart('vehicle', keys) ?? {};
  draft.fillPart('checks', CHECKS);
  draft.fillPart('workshop', ['temperatureC', 'humidityPct']);
  fillInvoice(draft);
  fillStages(draft, 'estimate');
  fillStages(draft, 'actual');
  fillEstimate(draft);
  fillProducts(draft, stored?.products ?? []);
  fillConsumables(draft, stored?.consumables ?? []);
  fillFindings(draft, stored?.findings ?? []);
  return draft;
}

const INVOICE = ['number', 'issuedOn', 'totalCents'];

/** Emptied columns take the bill away (rule 73); without columns for it the stored one stays. */
function fillInvoice(draft: RowBody): void {
  const asked = INVOICE.some((key) => draft.row.has(`invoice.${key}`));
  if (draft.fillPart('invoice', INVOICE) === undefined && asked) draft.body['invoice'] = null;
}

function fillStages({ row, body, places }: RowBody, part: 'estimate' | 'actual'): void {
  for (const stage of STAGES) places.set(`/${part}/stages/${stage}`, `${part}.${stage}`);
  if (!STAGES.some((stage) => row.has(`${part}.${stage}`))) return;
  const before = body[part] as { stages?: Record<string, number> } | undefined;
  const stages = { ...before?.stages };
  for (const stage of STAGES) {
    if (!row.has(`${part}.${stage}`)) continue;
    const minutes = row.number(`${part}.${stage}`);
    if (minutes === undefined) delete stages[stage];
    else stages[stage] = minutes;
  }
  body[part] = { ...before, stages };
}

/** An estimate has a price; with neither price nor minutes there is none. */
function fillEstimate(draft: RowBody): void {
  const { row, body } = draft;
  draft.places.set('/estimate/priceCents', 'estimate.priceCents');
  const before = body['estimate'] as
    { priceCents?: number; stages?: Record<string, number> } | undefined;
  const asked = row.has('estimate.priceCents');
  const priceCents = asked ? row.number('estimate.priceCents') : before?.priceCents;
  const stages = before?.stages ?? {};
  const planned = Object.values(stages).some((minutes) => minutes > 0);
  const unreadable = asked && priceCents === undefined && !row.isEmpty('estimate.priceCents');
  if (priceCents === undefined && !planned && !unreadable) delete body['estimate'];
  else body['estimate'] = { ...(priceCents !== undefined && { priceCents }), stages };
}
