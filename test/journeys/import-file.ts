import type { Page } from 'playwright-core';

/** A file as a person has it on their disk. */
export interface FileToSend {
  name: string;
  mimeType: string;
  buffer: Buffer;
}

/** The headings of the office's spreadsheet. */
export const HEADINGS =
  'Job no;Make;Model;Body type;Registered;Package;Completed on;strip;apply;CW1 ml;Invoice total;Invoice number;Invoice date;Note';

/** What the office of a branch saves from its spreadsheet: semicolons, decimal commas, Windows-1252, days first. */
export function officeFile(rows: readonly string[], headings = HEADINGS): FileToSend {
  const text = [headings, ...rows].map((line) => `${line}\r\n`).join('');
  // Every character used is below U+0100, where Windows-1252 and Latin-1 agree.
  return { name: 'spring.csv', mimeType: 'text/csv', buffer: Buffer.from(text, 'latin1') };
}

/** A car of the file; `change` replaces cells by their place. */
export function officeRow(ref: string, change: Readonly<Record<number, string>> = {}): string {
  const cells = [
    ref,
    'Orsa',
    'Brinkeby',
    'estate',
    '03/2011',
    'cavity',
    '14.03.2025',
    '45',
    '1:20',
    '2100',
    '412,50',
    `R-${ref}`,
    '15.03.2025',
    'Schwellerblech geprüft',
  ];
  return cells.map((cell, place) => change[place] ?? cell).join(';');
}

/** Chooses a file on the page *Import* and sends it to be looked at; waits until it has been. */
export async function sendFile(page: Page, file: FileToSend): Promise<void> {
  await page.locator('input[type=file]').setInputFiles(file);
  await page.getByRole('button', { name: 'See what it would change' }).click();
  await page.waitForURL(/file=/);
  await page.getByRole('form', { name: 'How the file is read' }).waitFor();
}
