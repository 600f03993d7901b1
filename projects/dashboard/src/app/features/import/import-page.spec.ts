import { HttpEventType } from '@angular/common/http';
import { signal } from '@angular/core';
import type { ImportedFile } from '#shared/contracts/imports';
import { importedFile } from '../../testing/import-answers';
import { openPage } from '../../testing/open-page';
import { ImportPage } from './import-page';

const TWO = [
  { code: 'HAV', name: 'Havnsund' },
  { code: 'SOL', name: 'Solvik' },
];

async function open(inputs: Record<string, unknown>, branches = TWO) {
  const value = { branches, products: [], packages: [{ code: 'full', name: 'Full' }] };
  const { http, settle, host } = await openPage(ImportPage, {
    url: '/import',
    role: 'site_manager',
    catalogue: {
      value: signal(value),
      branches: signal(branches),
      branchName: (code: string) => branches.find((one) => one.code === code)?.name ?? code,
    },
    inputs,
  });
  const button = (words: RegExp) =>
    [...host.querySelectorAll('button')].find((one) => words.test(one.textContent));
  const press = async (words: RegExp): Promise<void> => {
    button(words)!.click();
    await settle();
  };
  const choose = async (file: File): Promise<void> => {
    const box = host.querySelector<HTMLInputElement>('input[type=file]')!;
    Object.defineProperty(box, 'files', { value: [file], configurable: true });
    box.dispatchEvent(new Event('change'));
    await settle();
  };
  const select = async (id: string, words: string): Promise<void> => {
    const box = host.querySelector<HTMLSelectElement>(id)!;
    box.value = words;
    box.dispatchEvent(new Event('change'));
    await settle();
  };
  return { http, settle, host, button, press, choose, select };
}

/** Opens a file where it stands. */
async function openFile(change: Partial<ImportedFile> = {}) {
  const page = await open({ branch: 'HAV', file: 'f1' });
  const url = '/api/branches/HAV/imports/f1';
  await asked();
  page.http.expectOne(url).flush(importedFile(change));
  await page.settle();
  return { ...page, url };
}

/** The first question of a file that may be under way comes with its timer. */
const asked = (): Promise<void> => new Promise((done) => setTimeout(done, 20));
const csv = (name = 'winter.csv'): File => new File(['Job;Done'], name, { type: 'text/csv' });

describe('ImportPage', () => {
  it('several branches and none chosen, sends nothing and says what is missing', async () => {
    const { http, host, choose, press } = await open({});
    await choose(csv());
    await press(/See what it would change/);
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Choose the branch first');
    http.verify();
  });

  it('a workbook, is refused before it is sent', async () => {
    const { http, host, choose, press } = await open({}, TWO.slice(0, 1));
    http.expectOne('/api/branches/HAV/imports').flush({ items: [] });
    await choose(csv('winter.xlsx'));
    expect(host.querySelector('[role=alert]')?.textContent).toContain('CSV (UTF-8)');
    await press(/See what it would change/);
    http.verify();
  });

  it('a file sent, shows how much has gone and can be stopped', async () => {
    const { http, host, choose, press, settle } = await open({ branch: 'HAV' });
    await choose(csv());
    await press(/See what it would change/);
    const request = http.expectOne('/api/branches/HAV/jobs/file');
    expect((request.request.body as FormData).get('file')).toBeInstanceOf(File);
    request.event({ type: HttpEventType.UploadProgress, loaded: 250_000, total: 1_000_000 });
    await settle();
    const bar = host.querySelector('[role=progressbar]')!;
    expect(bar.getAttribute('aria-valuenow')).toBe('250000');
    await press(/Stop sending/);
    expect(request.cancelled).toBe(true);
    expect(host.querySelector('.drop')?.textContent).toContain('winter.csv');
  });

  it('a file checked, shows its counts, its reasons and what confirming writes', async () => {
    const { host, button } = await openFile();
    expect(host.querySelector('h1')?.textContent).toContain('1,204 rows: 1,150 new');
    expect(button(/Write 1,181 cars/)?.disabled).toBe(false);
    expect(host.textContent).toContain('Done: is not a day; has no model');
    expect(host.querySelectorAll('us-row-status')).toHaveLength(2);
    expect(button(/Refused rows as CSV, 11/)).toBeDefined();
  });

  it('a column chosen otherwise, must be checked again before anything is written', async () => {
    const { http, settle, button, press, select, url } = await openFile();
    await select('#us-column-1', 'notes');
    expect(button(/Write 1,181 cars/)?.disabled).toBe(true);
    await press(/Check it again like this/);
    const put = http.expectOne({ method: 'PUT', url });
    expect(put.request.body).toMatchObject({
      options: { decimal: ',' },
      columns: [
        { index: 0, field: 'jobRef' },
        { index: 1, field: 'notes' },
        { index: 2, field: 'completedOn' },
      ],
    });
    put.flush(importedFile({ state: 'checking' }));
    await settle();
    await asked();
    expect(http.match({ method: 'GET', url })).toHaveLength(1);
  });

  it('a needed column missing, says so first and offers nothing to write', async () => {
    const { host, button } = await openFile({ missingFields: ['package'] });
    expect(host.querySelector('h1')?.textContent).toContain('No column gives: Package.');
    expect(button(/^\s*Write/)).toBeUndefined();
  });

  it('confirmed, is followed until it has ended and leads to the cars', async () => {
    const { http, settle, host, press, url } = await openFile();
    await press(/Write 1,181 cars/);
    http.expectOne(`${url}/confirm`).flush(importedFile({ state: 'writing' }));
    await settle();
    await asked();
    const progress = { done: 400, of: 1181 };
    http.expectOne(url).flush(importedFile({ state: 'writing', progress }));
    await settle();
    expect(host.querySelector('[role=progressbar]')?.getAttribute('aria-valuetext')).toBe(
      '400 of 1,181 rows',
    );
    await new Promise((done) => setTimeout(done, 750));
    const written = { created: 1150, replaced: 31, unchanged: 12, refused: 11 };
    http.expectOne(url).flush(importedFile({ state: 'done', written }));
    await settle();
    expect(host.querySelector('h1')?.textContent).toContain('1,181 cars written');
    const links = [...host.querySelectorAll('a')].map((link) => link.getAttribute('href'));
    expect(links).toContain('/jobs?branch=HAV');
    await new Promise((done) => setTimeout(done, 750));
    http.verify();
  });

  it('stopped halfway, says what stays and offers the rest', async () => {
    const written = { created: 1000, replaced: 0, unchanged: 0, refused: 0 };
    const { host, button } = await openFile({
      state: 'cancelled',
      written,
      progress: { done: 1016, of: 1204 },
    });
    expect(host.querySelector('h1')?.textContent).toContain('1,000 cars are written and stay');
    expect(button(/Write the rest/)).toBeDefined();
  });

  it('files sent before, are listed and open again', async () => {
    const { http, settle, host } = await open({ branch: 'HAV' });
    const item = importedFile({ state: 'done' });
    http.expectOne('/api/branches/HAV/imports').flush({ items: [item] });
    await settle();
    const link = [...host.querySelectorAll('a')].find((one) => one.textContent === 'winter.csv');
    expect(link?.getAttribute('href')).toBe('/import?branch=HAV&file=f1');
  });
});
