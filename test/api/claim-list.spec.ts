import { parse } from 'csv-parse/sync';
import { sql } from '#db/database';
import type { ClaimRow } from '#shared/contracts/claim-list';
import { TestApp, type Answer } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;

/** Jobs by branch and reference: the day each was completed and what else is particular of it. */
const JOBS = [
  ['AAA', 'old', '2022-01-31', {}],
  ['AAA', 'short', '2023-08-31', { package: 'cavity' }],
  ['AAA', 'new', '2025-08-31', {}],
  ['BBB', 'b', '2024-05-10', { vehicle: vehicle({ make: 'Ormesh', firstRegistered: '2021-03' }) }],
] as const;
/** Claims by reference: on which job, made when, decided how. */
const CLAIMS = [
  [
    'AAA',
    'first',
    'old',
    '2022-02-28',
    { decision: 'accepted', decidedOn: '2022-03-02', costCents: 500 },
  ],
  ['AAA', 'last-day', 'old', '2025-01-31', { decision: 'open', costCents: 900, side: 'left' }],
  ['AAA', 'too-late', 'old', '2025-02-01', { decision: 'goodwill', costCents: 100 }],
  [
    'AAA',
    'refused',
    'short',
    '2024-02-29',
    { decision: 'refused', decidedOn: '2024-06-01', zone: 'floor' },
  ],
  [
    'AAA',
    'NÉW',
    'new',
    '2025-09-30',
    { decision: 'accepted', costCents: 700, cause: 'drain_blocked' },
  ],
  ['AAA', 'recent', 'new', '2026-02-02', { decision: 'open' }],
  [
    'BBB',
    'theirs',
    'b',
    '2025-05-10',
    { decision: 'accepted', costCents: 40, paidOn: '2025-06-01' },
  ],
] as const;

function vehicle(over: object): object {
  return { ...(validJob()['vehicle'] as object), ...over };
}

beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  for (const [branch, ref, completedOn, over] of JOBS) {
    const job = { completedOn, bookedOn: undefined, startedOn: undefined, invoice: null, ...over };
    await put(`/api/branches/${branch}/jobs/${ref}`, validJob(job));
  }
  for (const [branch, ref, jobRef, madeOn, over] of CLAIMS) {
    const claim = { jobRef, madeOn, zone: 'sill_outer', cause: 'missed_area', ...over };
    await put(`/api/branches/${branch}/claims/${encodeURIComponent(ref)}`, claim);
  }
});
afterAll(() => app.stop());

async function put(path: string, body: object): Promise<void> {
  const answer = await app.call('put', path, { token: network.office, body });
  if (answer.status >= 300) throw new Error(`${path}: ${answer.text}`);
}
const list = (query = '', token = network.office): Promise<Answer> =>
  app.call('get', `/api/claims${query}`, { token });
const refs = ({ body }: Answer): string[] => body.items.map(({ claimRef }: ClaimRow) => claimRef);
const found = async (query: string): Promise<string[]> => refs(await list(query)).sort();
const problems = ({ status, body }: Answer): unknown[] => [
  status,
  body.problems?.map(({ path }: { path: string }) => path),
];

describe('GET /api/claims', () => {
  it('given no parameter, lists every claim in scope, the last made first, with their cost', async () => {
    const answer = await list();
    expect(refs(answer)).toEqual([
      ...['recent', 'NÉW', 'theirs', 'too-late', 'last-day', 'refused', 'first'],
    ]);
    expect(answer.body).toMatchObject({ nextCursor: null, claims: 7, costCents: 2240 });
    expect(answer.body.items[2]).toEqual({
      branch: 'BBB',
      claimRef: 'theirs',
      revision: 1,
      jobRef: 'b',
      vehicle: {
        make: 'Ormesh',
        model: 'Tessock',
        bodyType: 'hatchback',
        firstRegistered: '2021-03',
      },
      package: 'full',
      completedOn: '2024-05-10',
      madeOn: '2025-05-10',
      month: 12,
      inWarranty: true,
      counted: true,
      zone: 'sill_outer',
      side: null,
      cause: 'missed_area',
      decision: 'accepted',
      proposedDecision: null,
      decidedOn: null,
      paidOn: '2025-06-01',
      labourMinutes: 0,
      productMl: 0,
      costCents: 40,
    });
    expect(refs(await list('', network.lead))).toHaveLength(7);
    expect(refs(await list('', network.manager))).not.toContain('theirs');
  });

  it('given other sorts, puts the dearest or the job last completed first; pages make up the list', async () => {
    expect(refs(await list('?sort=cost'))).toEqual([
      ...['last-day', 'NÉW', 'first', 'too-late', 'theirs', 'recent', 'refused'],
    ]);
    expect(refs(await list('?sort=completed'))).toEqual([
      ...['NÉW', 'recent', 'theirs', 'refused', 'first', 'last-day', 'too-late'],
    ]);
    for (const sort of ['made', 'cost', 'completed']) {
      const seen: string[] = [];
      let cursor = '';
      do {
        const page = await list(`?sort=${sort}&limit=2${cursor}`);
        expect(page.body).toMatchObject({ claims: 7, costCents: 2240 });
        seen.push(...refs(page));
        cursor = page.body.nextCursor === null ? '' : `&cursor=${page.body.nextCursor as string}`;
      } while (cursor !== '');
      expect(seen).toEqual(refs(await list(`?sort=${sort}`)));
    }
  });

  it('given a day, counts what was made and not refused by then and by the end of the warranty (rule 14)', async () => {
    const counted = (asOf: string) => found(`?counted=true&asOf=${asOf}`);
    expect(await found('?counted=true')).toEqual(
      ['NÉW', 'first', 'last-day', 'recent', 'theirs'].sort(),
    );
    expect(await found('?counted=false')).toEqual(['refused', 'too-late']);
    expect(await counted('2024-02-28')).toEqual(['first']);
    // Made, and refused only on 1 June.
    expect(await counted('2024-05-31')).toEqual(['first', 'refused']);
    expect(await counted('2024-06-01')).toEqual(['first']);
    expect(await counted('2025-01-31')).toEqual(['first', 'last-day']);
    const { body } = await list('?asOf=2024-05-31');
    expect(body.claims).toBe(7);
    const told = (body.items as ClaimRow[]).map((row) => [row.claimRef, row.month, row.inWarranty]);
    expect(Object.fromEntries(told.map(([ref, ...rest]) => [ref, rest]))).toEqual({
      first: [1, true],
      'last-day': [36, true],
      'too-late': [37, false],
      refused: [6, true],
      NÉW: [1, true],
      recent: [6, true],
      theirs: [12, true],
    });
  });

  it('given filters, lists what fits them all; codes outside the scope match nothing (rule 22)', async () => {
    expect(await found('?decision=accepted')).toEqual(['NÉW', 'first', 'theirs'].sort());
    expect(await found('?cause=drain_blocked')).toEqual(['NÉW']);
    expect(await found('?zone=floor')).toEqual(['refused']);
    expect(await found('?ageBand=0-4')).toEqual(['theirs']);
    expect(await found('?cohort=2022-H1')).toEqual(['first', 'last-day', 'too-late']);
    expect(await found('?cohort=2023-H2')).toEqual(['refused']);
    expect(await found('?package=cavity')).toEqual(['refused']);
    expect(await found('?from=2025-08-31')).toEqual(['NÉW', 'recent'].sort());
    expect(await found('?to=2022-12-31')).toEqual(['first', 'last-day', 'too-late']);
    expect(await found('?branch=AAA&jobRef=new')).toEqual(['NÉW', 'recent'].sort());
    expect(await found('?q=ormesh')).toEqual(['theirs']);
    expect(await found('?q=n%C3%A9w')).toEqual(['NÉW']);
    expect(await found('?q=SHORT')).toEqual(['refused']);
    expect(await found('?q=%25')).toEqual([]);
    expect(await found('?decision=open&cohort=2022-H1')).toEqual(['last-day']);
    for (const query of ['?branch=CCC', '?branch=ZZZ', '?region=HILLS']) {
      expect((await list(query)).body).toEqual({
        items: [],
        nextCursor: null,
        claims: 0,
        costCents: 0,
      });
      expect((await list(query, network.lead)).body).toMatchObject({ claims: 0, costCents: 0 });
    }
    expect((await list('?branch=BBB', network.manager)).body).toMatchObject({ claims: 0 });
  });

  it.each([
    ['?asOf=2026-02-04', '/query/asOf'],
    ['?asOf=soon', '/query/asOf'],
    ['?cohort=2024-H3', '/query/cohort'],
    ['?jobRef=new', '/query/jobRef'],
    ['?jobRef=new&branch=AAA&branch=BBB', '/query/jobRef'],
    ['?waiting=1', '/query/waiting'],
    ['?sort=zone', '/query/sort'],
    ['?limit=0', '/query/limit'],
    ['?package=nothing', '/query/package'],
    ['?cursor=nonsense', '/query/cursor'],
    ['?side=left', '/query/side'],
  ])('given %s, is refused', async (query, path) => {
    expect(problems(await list(query))).toEqual([422, [path]]);
  });

  it('given a cursor of another order, or a period that ends before it begins, is refused', async () => {
    const { body } = await list('?limit=1');
    const cursor = body.nextCursor as string;
    expect(problems(await list(`?sort=cost&cursor=${cursor}`))).toEqual([422, ['/query/cursor']]);
    expect((await list('?from=2025-01-02&to=2025-01-01')).status).toBe(422);
  });

  it('given a recorder, has no money in it and no order by it (rule 24)', async () => {
    const { body } = await list('', network.recorder);
    expect(body.claims).toBe(6);
    expect(JSON.stringify(body)).not.toMatch(/cents/i);
    expect((await list('?sort=cost', network.recorder)).status).toBe(403);
    expect((await list('?sort=completed&limit=1', network.recorder)).status).toBe(200);
  });

  it('given a push key or nobody, is refused', async () => {
    expect((await list('', network.keys['AAA'])).status).toBe(403);
    expect((await app.call('get', '/api/claims')).status).toBe(401);
  });

  it('given a job that is voided, leaves its claims out until it returns (rule 59)', async () => {
    const job = '/api/branches/AAA/jobs/short';
    await app.call('delete', job, { token: network.manager });
    expect(await found('?zone=floor')).toEqual([]);
    expect((await list()).body.claims).toBe(6);
    await app.call('post', `${job}/restore`, { token: network.manager });
    expect(await found('?zone=floor')).toEqual(['refused']);
  });
});

describe('GET /api/exports/claims.csv', () => {
  const rowsOf = ({ text }: Answer) =>
    parse<Record<string, string>>(text, { columns: true, record_delimiter: '\r\n' });
  const csv = (query = '', token = network.office) =>
    app.call('get', `/api/exports/claims.csv${query}`, { token });

  it('given filters and a sort, has the rows of the list, every one with all its fields', async () => {
    for (const query of ['', '?sort=cost', '?cohort=2022-H1&asOf=2025-01-31', '?counted=false']) {
      const { body } = await list(query);
      const flat = (body.items as ClaimRow[]).map(({ vehicle: car, ...row }) =>
        Object.fromEntries(
          Object.entries({
            ...row,
            ...Object.fromEntries(
              Object.entries(car).map(([key, value]) => [`vehicle.${key}`, value]),
            ),
          }).map(([key, value]) => [key, value === null ? '' : String(value)]),
        ),
      );
      expect(rowsOf(await csv(query))).toEqual(flat);
    }
  });

  it('given a past day, holds the claims of jobs completed by then (rules 15 and 62)', async () => {
    const rows = rowsOf(await csv('?asOf=2023-12-31'));
    expect(rows.map(({ claimRef }) => claimRef)).toEqual([
      ...['too-late', 'last-day', 'refused', 'first'],
    ]);
    expect(rows.map(({ counted }) => counted)).toEqual(['false', 'false', 'false', 'true']);
  });

  it('given anyone who may read it, tells the trail; a recorder is refused', async () => {
    expect((await csv('?zone=floor', network.lead)).status).toBe(200);
    const event = app.kit.store.unscoped.first<{ action: string; actor: string }>(
      sql('audit_events').orderBy('id', 'desc').limit(1),
    );
    expect(event).toMatchObject({ action: 'export.claims', actor: 'lead@network.example' });
    expect((await csv('', network.recorder)).status).toBe(403);
  });
});
