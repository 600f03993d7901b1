import type { ImportKind } from '#shared/contracts/imports';
import { type ImportCatalogue, importFields } from '#shared/domain/import-fields';

/** Findings a file to begin with has columns for; more can be added under the next numbers. */
const FINDINGS = 2;

/** The headings of a file to begin with: each thing once, what a row cannot do without first, products as the network has them. */
export function startingHeadings(kind: ImportKind, catalogue: ImportCatalogue): string[] {
  const fields = importFields(kind, catalogue);
  const own = catalogue.products.length > 0;
  const filled = new Set<string>();
  const kept = fields.filter(({ field, fills }) => {
    const [, finding] = /^finding(\d+)\./.exec(field) ?? [];
    if (Number(finding ?? 0) > FINDINGS) return false;
    // With a column for each product, numbered pairs of code and millilitres would say it twice.
    if (own && /^(product|ml)\.\d+$/.test(field)) return false;
    if (filled.has(fills)) return false;
    filled.add(fills);
    return true;
  });
  const needed = kept.filter((field) => field.required);
  return [...needed, ...kept.filter((field) => !field.required)].map((field) => field.label);
}

/** The text of a file with these headings and no row, marked as UTF-8 so that spreadsheets read it as such. */
export function startingFile(headings: readonly string[], delimiter: ',' | ';'): string {
  const cells = headings.map((heading) =>
    /[",;]/.test(heading) ? `"${heading.replaceAll('"', '""')}"` : heading,
  );
  return `\ufeff${cells.join(delimiter)}\r\n`;
}

/** What parts cells where the person's spreadsheet comes from: a semicolon where the comma parts decimals. */
export function usualDelimiter(language: string): ',' | ';' {
  const parts = new Intl.NumberFormat(language).formatToParts(1.5);
  return parts.some(({ type, value }) => type === 'decimal' && value === ',') ? ';' : ',';
}
