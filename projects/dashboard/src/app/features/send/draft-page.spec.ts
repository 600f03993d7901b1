import {
  type HttpInterceptorFn,
  HttpResponse,
  provideHttpClient,
  withInterceptors,
} from '@angular/common/http';
import { signal } from '@angular/core';
import { type ComponentFixture, TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import { of } from 'rxjs';
import type { Role } from '#shared/domain/vocabulary';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Drafts } from '../../core/drafts/drafts';
import { RETRY_PACE } from '../../core/drafts/retry-pace';
import { Session } from '../../core/session/session';
import { newDevice, notedAhead } from '../../testing/device';
import { JobServer } from '../../testing/job-server';
import { DraftPage } from './draft-page';
import type { DraftDocument } from './draft-document';

const CATALOGUE = {
  value: signal(undefined),
  today: signal('2026-02-02'),
  currency: signal('EUR'),
  packages: signal([{ code: 'full', name: 'Full' }]),
  branches: signal([{ code: 'HAV', name: 'Havnsund' }]),
  normsOf: () => [{ product: 'CW1', ml: 4000 }],
  productName: () => 'Cavity wax',
  packageName: () => 'Full',
  branchName: () => 'Havnsund',
};
const WHOLE: DraftDocument = {
  vehicle: { make: 'Velder', model: 'Tessock', bodyType: 'hatchback', firstRegistered: '2009-05' },
  package: 'full',
  completedOn: '2026-02-02',
  actual: { stages: { strip: 60 } },
};

/** What the form asks beside sending: nothing is known of such cars, no jobs were done lately. */
const beside: HttpInterceptorFn = (request, next) => {
  if (request.url.includes('/usual')) return of();
  if (request.url.endsWith('/photos')) return of(new HttpResponse({ body: { items: [] } }));
  if (request.url.startsWith('/api/jobs')) return of(new HttpResponse({ body: { items: [] } }));
  return next(request);
};

const wait = (ms: number): Promise<void> => new Promise((done) => setTimeout(done, ms));

async function open(step: string, content: DraftDocument = {}, role: Role = 'site_manager') {
  const server = new JobServer();
  const session = {
    person: signal({ id: 7 }),
    role: signal(role),
    usableToken: () => Promise.resolve('one'),
  };
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(withInterceptors([beside, server.interceptor])),
      provideRouter([{ path: '**', children: [] }]),
      { provide: Session, useValue: session },
      { provide: Catalogue, useValue: CATALOGUE },
      { provide: RETRY_PACE, useValue: () => 15 },
    ],
  });
  const drafts = TestBed.inject(Drafts);
  await drafts.whenRead();
  const { jobRef = '', ...rest } = content;
  const { id } = await drafts.begin('HAV', { jobRef, content: rest });
  const fixture = TestBed.createComponent(DraftPage);
  fixture.componentRef.setInput('draft', id);
  fixture.componentRef.setInput('step', step);
  const host = fixture.nativeElement as HTMLElement;
  const settle = async (): Promise<void> => {
    await wait(20);
    await fixture.whenStable();
  };
  await settle();
  const field = (path: string): HTMLInputElement =>
    host.querySelector<HTMLInputElement>(`[data-path="${path}"]`)!;
  const type = async (path: string, text: string): Promise<void> => {
    field(path).value = text;
    field(path).dispatchEvent(new Event('input'));
    await settle();
  };
  const button = (name: string | RegExp): HTMLButtonElement =>
    [...host.querySelectorAll('button')].find((one) => {
      const said = one.getAttribute('aria-label') ?? one.textContent.trim();
      return typeof name === 'string' ? said === name : name.test(said);
    })!;
  const press = async (name: string | RegExp): Promise<void> => {
    button(name).click();
    await settle();
  };
  return { drafts, id, fixture, host, server, settle, field, type, button, press };
}

async function stand(fixture: ComponentFixture<DraftPage>, step: string): Promise<void> {
  fixture.componentRef.setInput('step', step);
  await wait(20);
  await fixture.whenStable();
}

describe('DraftPage', () => {
  beforeEach(() => newDevice());
  afterEach(() => TestBed.resetTestingModule());

  it('typed into, given a moment, has it kept on the device, and shows it when opened again', async () => {
    const { drafts, id, type, host } = await open('car');
    expect(host.querySelector('h1')?.textContent).toContain('1 of 6, car and job');
    await type('/jobRef', 'A-17');
    await type('/vehicle/make', 'Velder');
    await wait(300);
    expect(drafts.find(id)).toMatchObject({
      jobRef: 'A-17',
      content: { vehicle: { make: 'Velder' } },
    });
    expect(host.querySelector('us-kept-line')?.textContent).toContain('Kept on this device');
  });

  it('left at once, given something just typed, keeps it all the same', async () => {
    const { drafts, id, type, fixture } = await open('car');
    await type('/vehicle/model', 'Tessock');
    fixture.destroy();
    await wait(50);
    expect(drafts.find(id)?.content.vehicle?.model).toBe('Tessock');
  });

  it('typed into without a pause, keeps what was typed meanwhile', async () => {
    const { drafts, id, type } = await open('car');
    const text = 'Tessock with the long bed';
    for (let length = 1; length <= text.length; length += 1) {
      await type('/vehicle/model', text.slice(0, length));
    }
    const kept = drafts.find(id)?.content.vehicle?.model ?? '';
    expect(kept.length).toBeGreaterThan(text.length / 4);
  });

  it('put away by the browser, given something just typed, has left a note of it in that very turn', async () => {
    const { type } = await open('car');
    await type('/vehicle/model', 'Tessock');
    expect(notedAhead()).toEqual([]);
    window.dispatchEvent(new Event('pagehide'));
    expect(notedAhead().map((place) => localStorage.getItem(place))).toEqual([
      expect.stringContaining('Tessock'),
    ]);
  });

  it('typed into, given what cannot be read, keeps the text in sight, says how to write it, and keeps no half of it', async () => {
    const { type, field, host, fixture } = await open('stages', WHOLE);
    await type('/actual/stages/strip', '1:75');
    expect(host.textContent).toContain('Write minutes as 90');
    await stand(fixture, 'car');
    await stand(fixture, 'stages');
    expect(field('/actual/stages/strip').value).toBe('1:75');
    await type('/actual/stages/strip', '1:15');
    expect(host.textContent).not.toContain('Write minutes as 90');
  });

  it('timed, given a timer started and the page opened again, runs on and stops into the minutes', async () => {
    const startedAt = new Date(Date.now() - 42 * 60_000).toISOString();
    const timers = { clean: { startedAt } };
    const { drafts, id, host, press, field } = await open('stages', { ...WHOLE, timers });
    expect(host.textContent.replace(/\u202f/g, ' ')).toContain('Timer running, 42 min so far');
    await press('Stop the timer of clean');
    expect(field('/actual/stages/clean').value).toBe('42');
    await press('clean, add 15 minutes');
    await wait(300);
    expect(drafts.find(id)?.content).toMatchObject({
      actual: { stages: { strip: 60, clean: 57 } },
    });
    expect(drafts.find(id)?.content).not.toHaveProperty('timers');
  });

  it('with findings, given one picked on the map, asks for all of it, and never assumes that it carries load', async () => {
    const { drafts, id, host, press } = await open('findings', WHOLE);
    host.querySelector<HTMLElement>('[role="radio"][aria-label="sill, inner, left"]');
    await press('As a list');
    host
      .querySelector<HTMLInputElement>('input[type="radio"][aria-label="sill, inner, left"]')!
      .click();
    await wait(20);
    await press('patched');
    await wait(300);
    expect(drafts.find(id)?.content.findings).toEqual([
      { ref: 'sill_inner/left/1', zone: 'sill_inner', side: 'left', action: 'patched' },
    ]);
    expect(host.querySelector('us-caution')?.textContent).toContain('Fire.');
  });

  it('looked over, given what is missing, names each, leads to its field, and sends nothing', async () => {
    const { host, press, server, drafts, id } = await open('review', { jobRef: 'A-17' });
    await wait(100);
    expect(host.textContent).toContain('The make is still missing.');
    await press('Send job');
    expect(host.querySelector('.foot [role=alert]')?.textContent).toContain('Not sent yet');
    expect(server.heard).toEqual([]);
    expect(drafts.find(id)?.state).toBe('editing');
    await press('The make is still missing.');
    expect(TestBed.inject(Router).url).toBe(`/send/${id}?step=car`);
  });

  it('sent, given a whole job, hands it over once and goes back to the list', async () => {
    const { press, server, drafts, id } = await open('review', { ...WHOLE, jobRef: 'A-17' });
    await wait(100);
    await press('Send job');
    for (let tries = 0; drafts.find(id)?.state !== 'sent' && tries < 100; tries += 1)
      await wait(20);
    expect(server.heard.map(({ call }) => call)).toEqual(['PUT /api/branches/HAV/jobs/A-17']);
    expect(TestBed.inject(Router).url).toBe('/send');
  });

  it('unusual, given product far from its norm, says so without keeping anybody from sending', async () => {
    const products = [{ product: 'CW1', ml: 500 }];
    const { host, server, press, drafts, id } = await open('review', {
      ...WHOLE,
      jobRef: 'A-18',
      products,
    });
    await wait(100);
    expect(host.textContent.replace(/\u202f/g, ' ')).toContain(
      '500 ml is 13 % of the norm of 4.0 L.',
    );
    await press('Send job');
    for (let tries = 0; drafts.find(id)?.state !== 'sent' && tries < 100; tries += 1)
      await wait(20);
    expect(server.jobs.has('HAV/A-18')).toBe(true);
  });

  it('for a recorder, given every step, shows no money but the price quoted', async () => {
    const extras = [{ on: '2026-02-01', minutes: 30 }];
    const content = { ...WHOLE, agreedExtras: extras };
    const { host, fixture } = await open('package', content, 'recorder');
    expect(host.textContent).toContain('Price quoted before tax, €');
    for (const step of ['car', 'stages', 'findings', 'product', 'invoice']) {
      await stand(fixture, step);
      expect(host.textContent).not.toContain('€');
    }
    expect(host.textContent).toContain('The bill is written in the office.');
  });

  it('of a job that is not here, given its address, says where it may be', async () => {
    const { fixture, host } = await open('car');
    const other = TestBed.createComponent(DraftPage);
    other.componentRef.setInput('draft', 'no-such');
    await wait(30);
    await other.whenStable();
    expect((other.nativeElement as HTMLElement).textContent).toContain('not on this device');
    expect(host.textContent).not.toContain('not on this device');
    fixture.destroy();
  });
});
