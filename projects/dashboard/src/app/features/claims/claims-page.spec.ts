import { signal } from '@angular/core';
import type { ClaimRow } from '#shared/contracts/claim-list';
import type { Role } from '#shared/domain/vocabulary';
import { openPage } from '../../testing/open-page';
import { ClaimsPage } from './claims-page';

const ROW: ClaimRow = {
  branch: 'HAV',
  claimRef: 'W-1',
  revision: 1,
  jobRef: '0417',
  vehicle: { make: 'Velder', model: 'Tessock', bodyType: 'hatchback', firstRegistered: '2009-05' },
  package: 'full',
  completedOn: '2024-03-03',
  madeOn: '2026-01-12',
  month: 23,
  inWarranty: true,
  counted: true,
  zone: 'sill_outer',
  side: 'left',
  cause: 'missed_area',
  decision: 'open',
  proposedDecision: null,
  decidedOn: null,
  paidOn: null,
  labourMinutes: 30,
  productMl: 0,
  costCents: 70_000,
};

async function open(role: Role, url = '/claims?branch=HAV', inputs: Record<string, string> = {}) {
  const { http, settle, host } = await openPage(ClaimsPage, {
    url,
    role,
    catalogue: {
      branches: signal([{ code: 'HAV', name: 'Havnsund', region: 'COAST' }]),
      regions: signal([{ code: 'COAST', name: 'Coast' }]),
      branchName: () => 'Havnsund',
      regionName: (code: string) => code,
      currency: signal('EUR'),
    },
    inputs,
  });
  /** Answers the list and the two counts beside it; gives what the list asked for. */
  const answer = async (
    rows: readonly ClaimRow[],
    counts = { open: 1, waiting: 0 },
  ): Promise<URLSearchParams> => {
    const asked = http.match(({ url: path }) => path.startsWith('/api/claims'));
    const queries = asked.map(
      ({ request }) => new URL(request.urlWithParams, 'http://app').searchParams,
    );
    asked.forEach((call, index) => {
      const query = queries[index]!;
      const one = query.get('limit') === '1';
      const claims = !one ? rows.length : query.has('waiting') ? counts.waiting : counts.open;
      const money = role === 'recorder' ? {} : { costCents: 70_000 };
      call.flush({ items: one ? [] : rows, nextCursor: null, claims, ...money });
    });
    await settle();
    return queries.find((query) => query.get('limit') === '50')!;
  };
  return { host, answer };
}
const heading = (host: HTMLElement): string => host.querySelector('h1')?.textContent.trim() ?? '';

describe('ClaimsPage', () => {
  it('opened: says what is open and what waits, over rows that lead to claim and job', async () => {
    const { host, answer } = await open('site_manager');
    const asked = await answer([ROW], { open: 12, waiting: 3 });
    expect([...asked]).toEqual([
      ['branch', 'HAV'],
      ['sort', 'made'],
      ['limit', '50'],
    ]);
    expect(heading(host)).toBe('Havnsund: 12 claims are open; 3 wait for head office.');
    const links = [...host.querySelectorAll('td a')].map((link) => link.getAttribute('href'));
    expect(links).toEqual(['/claims/HAV/W-1', '/jobs/HAV/0417']);
  });

  it('with filters in the URL: asks for them and says them in words', async () => {
    const written = { decision: 'open', cause: 'missed_area', counted: 'true', sort: 'cost' };
    const { host, answer } = await open('site_manager', '/claims?branch=HAV', written);
    const asked = await answer([ROW]);
    expect(Object.fromEntries(asked)).toMatchObject(written);
    expect(heading(host)).toBe('Havnsund: 1 claim fits.');
    expect(host.textContent).toContain(
      'Only those still open, for “missed area”, that count; together €700 before tax.',
    );
  });

  it('of a claim that waits: shows it as proposed, never as decided', async () => {
    const { host, answer } = await open('site_manager');
    await answer([{ ...ROW, proposedDecision: 'accepted' }]);
    const mark = host.querySelector('td us-decision-mark')!;
    expect(mark.textContent).toMatch(/waits for head office\s*proposed: accepted/);
    expect(mark.querySelector('svg.proposed')).not.toBeNull();
  });

  it('of a claim that does not count: says why', async () => {
    const { host, answer } = await open('site_manager');
    await answer([{ ...ROW, counted: false, inWarranty: false }]);
    expect(host.querySelector('tbody')?.textContent).toContain("after the warranty's end");
  });

  it('for a recorder: shows and asks for no money, and takes no order by it from the URL', async () => {
    const { host, answer } = await open('recorder', '/claims', { sort: 'cost' });
    const { costCents: _, ...unseen } = ROW;
    const asked = await answer([unseen]);
    expect(asked.get('sort')).toBe('made');
    expect(host.textContent).not.toMatch(/€|CSV|Cost/);
  });
});
