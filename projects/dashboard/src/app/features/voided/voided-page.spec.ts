import { HttpTestingController } from '@angular/common/http/testing';
import { signal } from '@angular/core';
import { TestBed } from '@angular/core/testing';
import { openPage } from '../../testing/open-page';
import { VoidedPage } from './voided-page';
import type { VoidedJob } from './voided-words';

const BRANCHES = [
  { code: 'HAV', name: 'Havnsund', region: 'C' },
  { code: 'TAN', name: 'Tangmoor', region: 'C' },
];
const JOB: VoidedJob = {
  branch: 'HAV',
  jobRef: '0417',
  revision: 2,
  make: 'Velder',
  model: 'Tessock',
  firstRegistered: '2012-05',
  package: 'full',
  completedOn: '2026-01-28',
  voidedAt: '2026-01-30T09:00:00Z',
  voidedBy: 'manager@underseam.example',
};

async function open(url: string, branches = BRANCHES) {
  const page = await openPage(VoidedPage, {
    url,
    role: 'head_office',
    catalogue: {
      branches: signal(branches),
      value: signal({ branches }),
      branchName: (code: string) => BRANCHES.find((one) => one.code === code)?.name ?? code,
      packageName: () => 'Full protection',
    },
  });
  const answer = async (branch: string, items: readonly VoidedJob[]) => {
    page.http
      .expectOne(({ url: asked }) => asked.startsWith(`/api/branches/${branch}/voided-jobs`))
      .flush({ items, nextCursor: null });
    await page.settle();
  };
  return { ...page, answer };
}

describe('VoidedPage', () => {
  afterEach(() => TestBed.inject(HttpTestingController).verify());

  it('of two branches, lists each that has any and names the other', async () => {
    const { host, answer } = await open('/voided');
    await answer('HAV', [JOB]);
    await answer('TAN', []);
    expect(host.querySelector('h1')?.textContent).toContain('1 job stands void');
    expect([...host.querySelectorAll('h2')].map((one) => one.textContent)).toEqual(['Havnsund']);
    expect(host.textContent).toContain('Velder Tessock 2012, Full protection, finished');
    expect(host.textContent).toContain('by manager@underseam.example');
    expect(host.textContent).toContain('None at Tangmoor.');
  });

  it('a network without a branch yet, says that nothing stands void and asks for nothing', async () => {
    const { host, settle } = await open('/voided', []);
    await settle();
    expect(host.querySelector('h1')?.textContent).toContain('No job stands void here.');
  });

  it('one brought back, says so and asks anew', async () => {
    const { host, http, settle, answer } = await open('/voided?branch=HAV');
    await answer('HAV', [JOB]);
    host.querySelector<HTMLButtonElement>('us-voided-list button')!.click();
    await settle();
    const call = http.expectOne('/api/branches/HAV/jobs/0417/restore');
    expect(call.request.method).toBe('POST');
    call.flush({ jobRef: '0417', revision: 2 });
    await settle();
    await answer('HAV', []);
    expect(host.querySelector('.us-done')?.textContent).toContain('is back');
    expect(host.querySelector('h1')?.textContent).toContain('No job stands void here.');
  });

  it('refused to be brought back, says why and keeps the row', async () => {
    const { host, http, settle, answer } = await open('/voided?branch=HAV');
    await answer('HAV', [JOB]);
    host.querySelector<HTMLButtonElement>('us-voided-list button')!.click();
    await settle();
    http
      .expectOne('/api/branches/HAV/jobs/0417/restore')
      .flush({ status: 404 }, { status: 404, statusText: 'Not Found' });
    await settle();
    expect(host.querySelector('[role=alert]')?.textContent).toContain('Not found');
    expect(host.querySelectorAll('li')).toHaveLength(1);
  });
});
