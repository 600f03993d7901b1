import type { IssuedReport } from '#shared/contracts/warranty-reports';

/** Whether a file is the report as issued, byte for byte, judged by its SHA-256. */
export function copyWords(
  { id, pdfSha256, csvSha256 }: IssuedReport,
  name: string,
  hash: string | undefined,
): string {
  if (hash === undefined) {
    return 'This browser cannot compute SHA-256 here; compare with a program of your own.';
  }
  if (hash === pdfSha256) return `${name} is the PDF of report ${id}, byte for byte.`;
  if (hash === csvSha256) return `${name} is the CSV of report ${id}, byte for byte.`;
  return `${name} is neither file of report ${id}: its SHA-256 is ${hash}.`;
}
