import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import type { Role } from '#shared/domain/vocabulary';
import { Session } from '../../core/session/session';
import { comeBackRow } from '../../testing/come-back-answers';
import { ComeBackForm } from './come-back-form';

const URL = '/api/branches/HAV/come-back/0417/sill_inner%2Fleft%2F1';

async function open(finding = comeBackRow('0417'), role: Role = 'site_manager') {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      { provide: Session, useValue: { role: signal(role), person: signal(undefined) } },
    ],
  });
  const http = TestBed.inject(HttpTestingController);
  const fixture = TestBed.createComponent(ComeBackForm);
  fixture.componentRef.setInput('of', finding);
  fixture.componentRef.setInput('today', '2026-02-02');
  const marked: object[] = [];
  fixture.componentInstance.marked.subscribe((one) => marked.push(one));
  const settle = async (): Promise<void> => {
    await new Promise((done) => setTimeout(done));
    fixture.detectChanges();
  };
  await settle();
  const host = fixture.nativeElement as HTMLElement;
  const field = <T extends HTMLElement = HTMLInputElement>(name: string): T =>
    host.querySelector<T>(`[name=${name}]`)!;
  const type = async (name: string, text: string): Promise<void> => {
    field(name).value = text;
    field(name).dispatchEvent(new Event('input'));
    await settle();
  };
  const choose = async (status: string): Promise<void> => {
    const radio = host.querySelector<HTMLInputElement>(`input[type=radio][value=${status}]`)!;
    radio.checked = true;
    radio.dispatchEvent(new Event('change'));
    await settle();
  };
  const send = async (): Promise<void> => {
    host.querySelector('form')!.dispatchEvent(new Event('submit', { cancelable: true }));
    await settle();
  };
  return { http, host, field, type, choose, send, settle, marked, fixture };
}

/** Answers what the header's count asks for beside, if it does. */
function answered(http: HttpTestingController, body: object): void {
  http.expectOne({ method: 'PUT', url: URL }).flush(body);
}

describe('ComeBackForm', () => {
  beforeEach(() => sessionStorage.clear());

  it('dangerous: the caution stands first, and the day the owner was told is asked for again', async () => {
    const { http, host, choose, send } = await open();
    expect(host.textContent).toContain('may not be fit for the road');
    await choose('contacted');
    await send();
    http.expectNone(URL);
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Not told.');
    expect(host.querySelector('button[type=submit]')?.textContent).toContain(
      'Save without the date',
    );
    await send();
    expect(http.expectOne(URL).request.body).toEqual({ status: 'contacted' });
  });

  it('dangerous with its date: sent at once, only what was changed', async () => {
    const { http, type, send, settle, marked } = await open();
    await type('ownerToldOn', '2026-01-30');
    await type('note', ' rang twice ');
    await send();
    const request = http.expectOne(URL);
    expect(request.request.body).toEqual({
      status: 'open',
      ownerToldOn: '2026-01-30',
      note: 'rang twice',
    });
    request.flush(comeBackRow('0417', { ownerToldOn: '2026-01-30' }));
    await settle();
    expect(marked).toHaveLength(1);
    expect(sessionStorage).toHaveLength(0);
  });

  it('a date taken away: sent as null', async () => {
    const { http, type, send } = await open(
      comeBackRow('0417', { structural: false, dueOn: '2026-03-01' }),
    );
    await type('dueOn', '');
    await send();
    expect(http.expectOne(URL).request.body).toEqual({ status: 'open', dueOn: null });
  });

  it('the line breaks: what was typed stays, and is there when the form is opened again', async () => {
    const first = await open(comeBackRow('0417', { structural: false }));
    await first.type('note', 'rang twice');
    await first.send();
    first.http.expectOne(URL).error(new ProgressEvent('error'));
    await first.settle();
    expect(first.host.querySelector('[role=alert]')?.textContent).toContain('kept here');
    expect(first.field<HTMLTextAreaElement>('note').value).toBe('rang twice');
    first.fixture.destroy();
    TestBed.resetTestingModule();
    const { field } = await open(comeBackRow('0417', { structural: false }));
    expect(field<HTMLTextAreaElement>('note').value).toBe('rang twice');
  });

  it('a recorder: may set contacted and booked, nothing else', async () => {
    const { host, send, choose, http } = await open(
      comeBackRow('0417', { structural: false }),
      'recorder',
    );
    const values = [...host.querySelectorAll<HTMLInputElement>('[type=radio]')].map(
      ({ value }) => value,
    );
    expect(values).toEqual(['contacted', 'booked']);
    await send();
    http.expectNone(URL);
    await choose('booked');
    await send();
    answered(http, comeBackRow('0417', { status: 'booked' }));
  });
});
