import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import type { Column } from './column';
import { DataTable } from './data-table';

interface Row {
  readonly job: string;
  readonly kept: number;
}
const COLUMNS: readonly Column<Row>[] = [
  {
    key: 'job',
    label: 'Job',
    text: (row) => row.job,
    link: (row) => ({ commands: ['/jobs', 'HAV', row.job] }),
    total: '2 cars',
  },
  {
    key: 'kept',
    label: 'Kept',
    kind: 'number',
    text: (row) => String(row.kept),
    sortBy: (row) => row.kept,
    total: '100',
  },
];
const ROWS: readonly Row[] = [
  { job: '04/17', kept: 20 },
  { job: '0418', kept: 80 },
];

async function shown(columns = COLUMNS) {
  TestBed.configureTestingModule({ providers: [provideRouter([])] });
  const fixture = TestBed.createComponent(DataTable<Row>);
  fixture.componentRef.setInput('label', 'Cars');
  fixture.componentRef.setInput('columns', columns);
  fixture.componentRef.setInput('rows', ROWS);
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const jobs = () =>
    [...element.querySelectorAll('tbody tr td:first-child')].map((cell) =>
      cell.textContent?.trim(),
    );
  return { element, fixture, jobs };
}

describe('DataTable', () => {
  it('at first keeps the order of the rows and names itself', async () => {
    const { element, jobs } = await shown();
    expect(jobs()).toEqual(['04/17', '0418']);
    expect(element.querySelector('table')?.getAttribute('aria-label')).toBe('Cars');
  });

  it('pressed on a number’s head sorts the largest first and says so', async () => {
    const { element, fixture, jobs } = await shown();
    const head = element.querySelectorAll('th')[1];
    head?.querySelector<HTMLElement>('.mat-sort-header-container')?.click();
    await fixture.whenStable();
    expect(jobs()).toEqual(['0418', '04/17']);
    expect(head?.getAttribute('aria-sort')).toBe('descending');
  });

  it('with a reference that holds a slash links to one segment', async () => {
    const { element } = await shown();
    expect(element.querySelector('td a')?.getAttribute('href')).toBe('/jobs/HAV/04%2F17');
  });

  it('with totals has one foot row, without any none', async () => {
    const { element } = await shown();
    expect(
      [...element.querySelectorAll('tfoot td')].map((cell) => cell.textContent?.trim()),
    ).toEqual(['2 cars', '100']);
    TestBed.resetTestingModule();
    const plain = await shown(COLUMNS.map((column) => ({ ...column, total: undefined })));
    expect(plain.element.querySelector('tfoot td')).toBeNull();
  });
});
