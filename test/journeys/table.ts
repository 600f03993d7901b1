import type { Locator } from 'playwright-core';

/** A table as it is read on screen: a record a row, by the words at the heads of its columns. */
export async function readTable(table: Locator): Promise<Record<string, string>[]> {
  return table.evaluate((element) => {
    const words = (cell: Element): string => (cell.textContent ?? '').replace(/\s+/g, ' ').trim();
    const heads = [...element.querySelectorAll('thead th')].map(words);
    return [...element.querySelectorAll('tbody tr')].map((row) =>
      Object.fromEntries([...row.children].map((cell, index) => [heads[index] ?? '', words(cell)])),
    );
  });
}
