import { provideHttpClient } from '@angular/common/http';
import { HttpTestingController, provideHttpClientTesting } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { provideRouter, Router } from '@angular/router';
import type { Role } from '#shared/domain/vocabulary';
import { Catalogue } from '../../core/catalogue/catalogue';
import { Drafts } from '../../core/drafts/drafts';
import { Line } from '../../core/offline/line';
import { Session } from '../../core/session/session';
import { newDevice } from '../../testing/device';
import { SendPage } from './send-page';

const HAV = { code: 'HAV', name: 'Havnsund' };
const TEG = { code: 'TEG', name: 'Teglmaur' };
const UNDER_WAY = {
  branch: 'HAV',
  jobRef: '0417',
  revision: 2,
  content: { vehicle: { make: 'Velder', model: 'Tessock' }, timers: {} },
  startedBy: 'Mirre Oskvell',
  startedAt: '2026-02-02T06:00:00.000Z',
  changedBy: 'Ilse Torven',
  changedAt: '2026-02-02T07:00:00.000Z',
  photos: 1,
};
const wait = (ms: number): Promise<void> => new Promise((done) => setTimeout(done, ms));

async function open(branches = [HAV], branch?: string, role: Role = 'recorder') {
  TestBed.configureTestingModule({
    providers: [
      provideHttpClient(),
      provideHttpClientTesting(),
      provideRouter([{ path: '**', children: [] }]),
      {
        provide: Session,
        useValue: {
          person: signal({ id: 7 }),
          role: signal(role),
          usableToken: () => Promise.resolve('one'),
        },
      },
      {
        provide: Catalogue,
        useValue: {
          branches: signal(branches),
          value: signal({ branches, packages: [{ code: 'full' }] }),
          branchName: (code: string) => branches.find((one) => one.code === code)?.name ?? code,
          state: { problem: signal(undefined) },
        },
      },
    ],
  });
  const drafts = TestBed.inject(Drafts);
  await drafts.whenRead();
  const fixture = TestBed.createComponent(SendPage);
  fixture.componentRef.setInput('branch', branch);
  const host = fixture.nativeElement as HTMLElement;
  const settle = async (): Promise<void> => {
    await wait(20);
    fixture.detectChanges();
  };
  fixture.detectChanges();
  await settle();
  const http = TestBed.inject(HttpTestingController);
  const press = async (name: string): Promise<void> => {
    const found = [...host.querySelectorAll('button')].find(
      (one) => (one.getAttribute('aria-label') ?? one.textContent.trim()) === name,
    );
    found!.click();
    await settle();
  };
  /** The first draft's own page, once it is led to. */
  const ledTo = async (): Promise<string> => {
    const url = (): string => TestBed.inject(Router).url;
    for (let tries = 0; url() === '/' && tries < 100; tries += 1) await settle();
    return url();
  };
  return { drafts, host, http, press, settle, ledTo };
}

describe('SendPage', () => {
  beforeEach(() => newDevice());
  afterEach(() => TestBed.resetTestingModule());

  it('with one branch, given Begin a job, begins it there and opens it', async () => {
    const { drafts, press, ledTo } = await open();
    await press('Begin a job');
    const [draft] = drafts.list();
    expect(draft).toMatchObject({ branch: 'HAV', state: 'editing', step: 0 });
    expect(await ledTo()).toBe(`/send/${draft!.id}`);
  });

  it('in a network without a branch, says so in place of the beginning, and leads head office to the first steps', async () => {
    const { host } = await open([], 'HAV', 'head_office');
    expect(host.textContent).toContain('This network has no branch yet');
    expect(host.querySelector('.begin')).toBeNull();
    expect(host.querySelector('a[href="/first-run"]')).not.toBeNull();
  });

  it('with several branches, given none chosen, asks for it first', async () => {
    const { host, drafts } = await open([HAV, TEG]);
    const begin = [...host.querySelectorAll('button')].find((one) =>
      one.textContent.includes('Begin a job'),
    );
    expect(begin?.disabled).toBe(true);
    expect(host.textContent).toContain('First choose the branch');
    expect(drafts.list()).toEqual([]);
  });

  it('given what a colleague has under way, goes on with it here under its ETag', async () => {
    const { host, http, press, settle, drafts, ledTo } = await open();
    http.expectOne('/api/branches/HAV/under-way').flush({ items: [UNDER_WAY] });
    await settle();
    expect(host.textContent).toContain('Velder Tessock, job 0417');
    expect(host.textContent).toContain('Ilse Torven');
    await press('Go on: Velder Tessock, job 0417');
    http
      .expectOne('/api/branches/HAV/under-way/0417')
      .flush(UNDER_WAY, { headers: { ETag: '"r2"' } });
    expect(await ledTo()).toMatch(/^\/send\/.+/);
    expect(drafts.list()[0]).toMatchObject({ jobRef: '0417', keptAs: '"r2"', branch: 'HAV' });
    // It stands among the jobs of this device now, and there only.
    expect(host.textContent.match(/job 0417/g)).toHaveLength(1);
    expect(host.textContent).toContain('No others than those on this device.');
  });

  it('without a line, given that it comes back, reads what colleagues have under way again', async () => {
    const { host, http, settle } = await open();
    const line = TestBed.inject(Line);
    line.silent();
    http.expectOne('/api/branches/HAV/under-way').error(new ProgressEvent('error'));
    await settle();
    expect(host.textContent).toContain('No answer from the server');
    line.heard();
    await settle();
    http.expectOne('/api/branches/HAV/under-way').flush({ items: [UNDER_WAY] });
    await settle();
    expect(host.textContent).toContain('Velder Tessock, job 0417');
    expect(host.textContent).not.toContain('No answer from the server');
  });

  it('given a colleague’s job, drops it only when asked twice', async () => {
    const { http, press, settle } = await open();
    http.expectOne('/api/branches/HAV/under-way').flush({ items: [UNDER_WAY] });
    await settle();
    await press('Drop: Velder Tessock, job 0417');
    http.expectNone({ method: 'DELETE' });
    await press('Drop for good: Velder Tessock, job 0417');
    http.expectOne({ method: 'DELETE', url: '/api/branches/HAV/under-way/0417' }).flush(null);
    await settle();
    http.expectOne('/api/branches/HAV/under-way').flush({ items: [] });
  });
});
