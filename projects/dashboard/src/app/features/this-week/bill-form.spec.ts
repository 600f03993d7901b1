import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { TestBed } from '@angular/core/testing';
import { unbilledRow } from '../../testing/week-answers';
import { BillForm } from './bill-form';

const URL = '/api/branches/HAV/jobs/0398';

async function open(job: object = { estimate: { priceCents: 78_000 }, agreedExtras: [] }) {
  TestBed.configureTestingModule({ providers: [provideHttpClient(), provideHttpClientTesting()] });
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent(BillForm);
  fixture.componentRef.setInput('row', unbilledRow('0398', 19));
  fixture.componentRef.setInput('currency', 'EUR');
  fixture.componentRef.setInput('today', '2026-02-02');
  const said: string[] = [];
  fixture.componentInstance.billed.subscribe((words) => said.push(words));
  fixture.detectChanges();
  await settle();
  http.expectOne(URL).flush(job, { headers: { ETag: '"3"' } });
  await settle();
  async function settle(): Promise<void> {
    await new Promise((done) => setTimeout(done));
    fixture.detectChanges();
  }
  const host = fixture.nativeElement as HTMLElement;
  const field = (name: string): HTMLInputElement =>
    host.querySelector<HTMLInputElement>(`[formControlName=${name}]`)!;
  const type = (name: string, text: string): void => {
    field(name).value = text;
    field(name).dispatchEvent(new Event('input'));
  };
  const send = async (): Promise<void> => {
    host.querySelector('form')!.dispatchEvent(new Event('submit'));
    await settle();
  };
  return { http, host, field, type, send, settle, said };
}

describe('BillForm', () => {
  afterEach(() => TestBed.inject(HttpTestingController).verify());

  it('opened: filled with what was quoted and agreed, and today', async () => {
    const { field } = await open({
      estimate: { priceCents: 78_000 },
      agreedExtras: [{ on: '2026-01-20', minutes: 60, priceCents: 9_000 }],
    });
    expect(field('totalCents').value).toBe('870.00');
    expect(field('issuedOn').value).toBe('2026-02-02');
  });

  it('sent: the amount in cents, against the revision that was read', async () => {
    const { http, type, send, settle, said } = await open();
    type('totalCents', '812,50');
    type('number', ' 0431 ');
    await send();
    const request = http.expectOne(`${URL}/invoice`);
    expect(request.request.method).toBe('PUT');
    expect(request.request.headers.get('If-Match')).toBe('"3"');
    expect(request.request.body).toEqual({
      totalCents: 81_250,
      number: '0431',
      issuedOn: '2026-02-02',
    });
    request.flush({ jobRef: '0398', revision: 4, status: 'replaced' });
    await settle();
    expect(said).toEqual(['Job 0398 billed: €812.50.']);
  });

  it('an amount that reads two ways: not sent, and said', async () => {
    const { http, host, type, send } = await open();
    type('totalCents', '1,120');
    await send();
    http.expectNone(`${URL}/invoice`);
    expect(host.textContent).toContain('Write the amount as 870 or 870.50.');
  });

  it('no number: left out of what is sent', async () => {
    const { http, send } = await open();
    await send();
    const request = http.expectOne(`${URL}/invoice`);
    expect(request.request.body).toEqual({
      totalCents: 78_000,
      number: undefined,
      issuedOn: '2026-02-02',
    });
    request.flush({ jobRef: '0398', revision: 4, status: 'replaced' });
  });

  it('changed meanwhile by someone: says who, keeps what was typed, and sends against the new revision', async () => {
    const { http, host, field, type, send, settle, said } = await open();
    type('totalCents', '900');
    await send();
    http
      .expectOne(`${URL}/invoice`)
      .flush(
        { type: 'about:blank', title: 'Changed', status: 412, detail: 'Runa changed this job' },
        { status: 412, statusText: 'Precondition Failed' },
      );
    await settle();
    expect(host.textContent).toContain('Runa changed this job');
    expect(said).toEqual([]);
    host.querySelector<HTMLButtonElement>('[role=alert] button')!.click();
    await settle();
    http.expectOne(URL).flush({ estimate: { priceCents: 60_000 } }, { headers: { ETag: '"5"' } });
    await settle();
    expect(field('totalCents').value).toBe('900');
    await send();
    const again = http.expectOne(`${URL}/invoice`);
    expect(again.request.headers.get('If-Match')).toBe('"5"');
    again.flush({ jobRef: '0398', revision: 6, status: 'replaced' });
  });

  it('a field refused by the server: the message stands at the field', async () => {
    const { http, host, send, settle } = await open();
    await send();
    http.expectOne(`${URL}/invoice`).flush(
      {
        ...{
          type: 'about:blank',
          title: 'No',
          status: 422,
          detail: 'Some of this cannot be taken',
        },
        problems: [{ path: '/issuedOn', message: 'is in the future' }],
      },
      { status: 422, statusText: 'Unprocessable' },
    );
    await settle();
    expect(host.textContent).toContain('is in the future');
  });
});
