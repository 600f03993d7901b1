import type { AuditRow } from '#db/queries/audit-list';
import type { AuditEvent } from '#shared/contracts/audit';
import type { CostChange } from '#shared/domain/cost-book';
import { differences, pointerStep, type Difference } from '#shared/domain/flat-fields';
import { jobChanges } from '#shared/domain/job-changes';
import { rateOfMicros } from '#shared/domain/money';
import type { RecordedJob } from '#shared/domain/recorded-job';

/** An event with what changed taken apart field by field, wherever it tells before and after. */
export function tellEvent({ hash: _hash, previousHash: _before, ...row }: AuditRow): AuditEvent {
  const { changes, detail } = takenApart(row.action, JSON.parse(row.detail) as Detail);
  return { ...row, changes, detail };
}

type Detail = Record<string, unknown>;
type Changes = Difference<unknown>[];

function takenApart(action: string, detail: Detail): { changes: Changes; detail: Detail } {
  if ('change' in detail) {
    const { change, before, ...rest } = detail;
    return { changes: costChanges(change as CostChange, before), detail: rest };
  }
  if (!('before' in detail && 'after' in detail)) return { changes: [], detail };
  const { before, after, ...rest } = detail;
  const changes = action.startsWith('job.')
    ? jobChanges((before ?? undefined) as RecordedJob | undefined, after as RecordedJob)
    : differences(fieldsOf(before), fieldsOf(after), sameJson);
  return { changes, detail: rest };
}

/** What a cost was and became, in the field and the unit in which set-up was asked for it. */
function costChanges(change: CostChange, before: unknown): Changes {
  const told = (path: string, unit = (value: unknown): unknown => value): Changes =>
    differences(
      new Map([[path, unit(before ?? null)]]),
      new Map([[path, unit('value' in change ? change.value : null)]]),
    );
  switch (change.kind) {
    case 'hourlyCost':
      return told('/hourlyCostCents');
    case 'product':
      return told('/costPerLitreCents');
    case 'consumable':
      return told('/unitCostCents');
    case 'fee':
      return told('/feeRate', (micros) =>
        typeof micros === 'number' ? rateOfMicros(micros) : null,
      );
    case 'norm':
      return differences(fieldsOf({ norms: before }), fieldsOf({ norms: change.lines }), sameJson);
  }
}

/** Fields of any value by pointer: a list of products by their codes, any other list as one value. */
function fieldsOf(value: unknown, path = ''): Map<string, unknown> {
  if (value === null || value === undefined) return new Map();
  if (typeof value !== 'object') return new Map([[path, value]]);
  if (Array.isArray(value)) {
    return value.length > 0 && value.every(isProductLine)
      ? new Map(value.map(({ product, ml }) => [path + pointerStep(product), ml]))
      : new Map(value.length > 0 ? [[path, value]] : []);
  }
  return new Map(
    Object.entries(value).flatMap(([key, inner]) => [...fieldsOf(inner, path + pointerStep(key))]),
  );
}

function isProductLine(item: unknown): item is { product: string; ml: number } {
  return typeof item === 'object' && item !== null && 'product' in item && 'ml' in item;
}

function sameJson(a: unknown, b: unknown): boolean {
  return a === b || JSON.stringify(a) === JSON.stringify(b);
}
