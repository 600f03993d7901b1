import type { RecordedJob } from '#shared/domain/recorded-job';
import { CONSUMABLE_KINDS } from '#shared/domain/vocabulary';
import type { RowBody } from './row-body';

type Line = NonNullable<RecordedJob['consumables']>[number];

/** Fills the consumables of a job, kind by kind; lines that add up to what the file says stay as they are. */
export function fillConsumables(draft: RowBody, stored: readonly Line[]): void {
  const { row } = draft;
  let lines: Record<string, unknown>[] = stored.map((line) => ({ ...line }));
  let asked = false;
  for (const kind of CONSUMABLE_KINDS) {
    const [quantityFills, costFills] = [
      `consumables.${kind}.quantity`,
      `consumables.${kind}.unitCostCents`,
    ];
    if (!row.has(quantityFills) && !row.has(costFills)) continue;
    asked = true;
    const own = stored.filter((line) => line.kind === kind);
    const total = own.reduce((sum, line) => sum + line.quantity, 0);
    const quantity = row.has(quantityFills) ? row.number(quantityFills) : total;
    const costOf = (line: Line | undefined): number | undefined =>
      row.has(costFills) ? row.number(costFills) : line?.unitCostCents;
    const same =
      (quantity ?? 0) === total && own.every((line) => line.unitCostCents === costOf(line));
    if (same) continue;
    const cost = costOf(own[0]);
    const said = { kind, quantity, ...(cost !== undefined && { unitCostCents: cost }) };
    const at = lines.findIndex((line) => line['kind'] === kind);
    const place = at < 0 ? lines.length : at;
    const kept = lines.filter((line) => line['kind'] !== kind);
    lines = [...kept.slice(0, place), ...(quantity ? [said] : []), ...kept.slice(place)];
  }
  if (!asked) return;
  draft.body['consumables'] = lines;
  lines.forEach((line, index) => {
    const at = `/consumables/${index}`;
    draft.places.set(`${at}/quantity`, `consumables.${String(line['kind'])}.quantity`);
    draft.places.set(`${at}/unitCostCents`, `consumables.${String(line['kind'])}.unitCostCents`);
  });
}
