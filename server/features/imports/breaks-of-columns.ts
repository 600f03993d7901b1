import type { SentImport } from '#db/queries/imports';
import type { FieldProblem } from '#shared/contracts/fields';
import { importFields, type ImportCatalogue } from '#shared/domain/import-fields';

/** What is wrong with the columns that a person says: places that are not there, unknown fields, two for the same thing. */
export function breaksOfColumns(
  raw: unknown,
  { kind, columns: before }: Pick<SentImport, 'kind' | 'columns'>,
  catalogue: ImportCatalogue,
): FieldProblem[] {
  const body = raw as { columns?: unknown } | null | undefined;
  if (!Array.isArray(body?.columns)) return [];
  const fields = new Map(importFields(kind, catalogue).map((field) => [field.field, field]));
  const said = new Map<number, number>();
  const breaks: FieldProblem[] = [];
  const filling = new Map<string, string>();
  const fills = (place: string, heading: string, name: string, path: string): void => {
    const field = fields.get(name);
    if (!field) breaks.push({ path, message: 'is no field of this kind of file' });
    else if (filling.has(field.fills)) {
      const message = `"${filling.get(field.fills)}" fills this already; one column fills one field`;
      breaks.push({ path, message });
    } else filling.set(field.fills, heading || `column ${place}`);
  };
  (body.columns as unknown[]).forEach((entry, at) => {
    const { index, field } = (entry ?? {}) as { index?: unknown; field?: unknown };
    if (typeof index !== 'number') return;
    const column = before.find((one) => one.index === index);
    const path = `/columns/${at}`;
    if (!column) breaks.push({ path: `${path}/index`, message: 'the file has no such column' });
    else if (said.has(index)) breaks.push({ path: `${path}/index`, message: 'is said twice' });
    else if (typeof field === 'string') {
      fills(String(index + 1), column.heading, field, `${path}/field`);
    }
    said.set(index, at);
  });
  for (const { index, heading, field } of before) {
    if (field === null || said.has(index) || !fields.has(field)) continue;
    fills(String(index + 1), heading, field, '/columns');
  }
  return breaks;
}
