import { TestBed } from '@angular/core/testing';
import { provideHttpClient, withInterceptors } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { exportMargin } from '#shared/contracts/exports';
import { CsvLink } from './csv-link';

/** Lets a refused file be read as text. */
const settle = () => new Promise((resolve) => setTimeout(resolve, 20));

async function shown() {
  TestBed.configureTestingModule({
    // Without the session: here only the way of the file counts.
    providers: [provideHttpClient(withInterceptors([])), provideHttpClientTesting()],
  });
  const fixture = TestBed.createComponent(CsvLink);
  fixture.componentRef.setInput('endpoint', exportMargin);
  fixture.componentRef.setInput('query', { branch: ['HAV'], from: '2026-01-01' });
  fixture.componentRef.setInput('words', 'CSV of these 26 rows');
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  element.querySelector('button')?.click();
  await fixture.whenStable();
  const request = TestBed.inject(HttpTestingController).expectOne(
    '/api/exports/margin.csv?branch=HAV&from=2026-01-01',
  );
  return { element, fixture, request };
}

describe('CsvLink', () => {
  const saved: string[] = [];
  beforeEach(() => {
    saved.length = 0;
    URL.createObjectURL = () => 'blob:here';
    URL.revokeObjectURL = () => undefined;
    HTMLAnchorElement.prototype.click = function (this: HTMLAnchorElement) {
      saved.push(this.download);
    };
  });

  it('pressed asks for exactly the rows on screen and saves the file under its name', async () => {
    const { element, fixture, request } = await shown();
    expect(element.textContent).toContain('Being written');
    request.flush(new Blob(['week\r\n']));
    await fixture.whenStable();
    expect(saved).toEqual(['underseam-margin.csv']);
    expect(element.textContent).toContain('CSV of these 26 rows');
  });

  it('cancelled breaks off the request and saves nothing', async () => {
    const { element, fixture, request } = await shown();
    element.querySelector('button')?.click();
    await fixture.whenStable();
    expect(request.cancelled).toBe(true);
    expect(saved).toEqual([]);
    expect(element.textContent).toContain('CSV of these 26 rows');
  });

  it('broken off by the server says that nothing was saved', async () => {
    const { element, fixture, request } = await shown();
    request.error(new ProgressEvent('error'));
    await settle();
    await fixture.whenStable();
    expect(element.querySelector('[role=alert]')?.textContent).toContain('nothing was saved');
    expect(saved).toEqual([]);
  });
});
