import { TestApp } from '../support/app';
import { makeSmallNetwork, validJob, type SmallNetwork } from '../support/small-network';

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start({ now: '2026-02-02T06:30:00Z' });
  network = await makeSmallNetwork(app);
  const days = ['2026-01-26', '2026-01-27', '2026-01-28', '2026-01-29', '2026-01-30'];
  for (const branch of ['AAA', 'BBB']) {
    for (const [index, completedOn] of days.entries()) {
      const open = index === 4 ? { invoice: null } : { invoice: { totalCents: 80_000 + index } };
      const body = validJob({ completedOn, ...open });
      const path = `/api/branches/${branch}/jobs/${branch}-${index}`;
      const answer = await app.call('put', path, { token: network.keys[branch], body });
      expect(answer.status).toBe(201);
    }
  }
});
afterAll(() => app.stop());

const list = (query: string, token = network.lead) =>
  app.call('get', `/api/jobs${query}`, { token });
const refs = (body: { items: { jobRef: string }[] }) => body.items.map((item) => item.jobRef);

describe('GET /api/jobs', () => {
  it('given no parameter, lists every job in scope, newest first', async () => {
    const { status, body } = await list('');
    expect(status).toBe(200);
    expect(refs(body)).toEqual(
      [4, 3, 2, 1, 0].flatMap((index) => [`AAA-${index}`, `BBB-${index}`]),
    );
    expect(body).toMatchObject({ nextCursor: null, jobs: 10 });
    expect(body.items[0]).toMatchObject({
      unbilled: true,
      daysWaiting: 3,
      // 735 worked less 405 estimated less 120 of the finding that was charged.
      beyondChargedMinutes: 210,
      revenueCents: null,
      costCents: 49_410,
    });
    expect(body.items[2]).toMatchObject({
      unbilled: false,
      daysWaiting: null,
      beyondChargedMinutes: null,
      overrunMinutes: 330,
      marginCents: 80_003 - 49_410 - 4_000,
      expectedMarginCents: 45_000,
      largestStep: { step: 'rotLabour', cents: -11_100 },
    });
  });

  it('given a limit, hands out pages that make up the list', async () => {
    for (const sort of ['completed', 'margin', 'difference', 'overrun', 'waiting']) {
      const whole = refs((await list(`?sort=${sort}`)).body);
      const seen: string[] = [];
      let cursor = '';
      do {
        const { status, body } = await list(`?sort=${sort}&limit=3${cursor}`);
        expect(status).toBe(200);
        expect(body.jobs).toBe(10);
        seen.push(...refs(body));
        cursor = body.nextCursor === null ? '' : `&cursor=${body.nextCursor}`;
      } while (cursor !== '');
      expect(seen).toEqual(whole);
    }
  });

  it('given a cursor that is not one of this list, is refused (rule 67)', async () => {
    const { body } = await list('?limit=1');
    for (const query of [
      `?sort=margin&cursor=${body.nextCursor}`,
      '?cursor=nonsense',
      '?cursor=%00',
      '?cursor=',
    ]) {
      const refused = await list(query);
      expect(refused.status).toBe(422);
      expect(refused.body.problems.map(({ path }: never) => path)).toEqual(['/query/cursor']);
    }
  });

  it.each([
    ['?limit=0', '/query/limit'],
    ['?limit=201', '/query/limit'],
    ['?limit=x', '/query/limit'],
    ['?sort=colour', '/query/sort'],
    ['?unbilled=yes', '/query/unbilled'],
    ['?hasRot=1', '/query/hasRot'],
    ['?ageBand=old', '/query/ageBand'],
    ['?package=nothing', '/query/package'],
    ['?order=asc', '/query/order'],
  ])('given %s, is refused', async (query, path) => {
    const { status, body } = await list(query);
    expect(status).toBe(422);
    expect(body.problems.map((problem: { path: string }) => problem.path)).toEqual([path]);
  });

  it('given a period that ends before it begins, is refused; one end alone is enough', async () => {
    expect((await list('?from=2026-01-30&to=2026-01-29')).status).toBe(422);
    expect((await list('?from=2026-01-30')).body.jobs).toBe(2);
    expect((await list('?to=2026-01-26')).body.jobs).toBe(2);
  });

  it('given filters, lists what fits; codes outside the scope match nothing', async () => {
    const jobs = async (query: string) => (await list(query)).body.jobs;
    expect(await jobs('?unbilled=true')).toBe(2);
    expect(await jobs('?q=aaa-3')).toBe(1);
    expect(await jobs('?q=TESSOCK')).toBe(10);
    expect(await jobs('?q=%25')).toBe(0);
    expect(await jobs('?make=velder&model=tessock')).toBe(10);
    expect(await jobs('?make=vel')).toBe(0);
    expect(await jobs('?ageBand=15-19&hasRot=true&hasEstimate=true')).toBe(10);
    expect(await jobs('?branch=BBB')).toBe(5);
    expect(await jobs('?branch=CCC')).toBe(0);
    expect(await jobs('?region=HILLS')).toBe(0);
  });

  it('given a recorder, has no key of money in it and no sort by money (rule 24)', async () => {
    const { body } = await list('', network.recorder);
    expect(refs(body)).toEqual([4, 3, 2, 1, 0].map((index) => `AAA-${index}`));
    for (const item of body.items) {
      expect(Object.keys(item).filter((key) => /cents|margin|step/i.test(key))).toEqual([]);
    }
    for (const sort of ['margin', 'difference']) {
      expect((await list(`?sort=${sort}`, network.recorder)).status).toBe(403);
    }
    for (const sort of ['completed', 'overrun', 'waiting']) {
      const page = await list(`?sort=${sort}&limit=1`, network.recorder);
      expect(page.status).toBe(200);
    }
  });

  it('given places and products, lists the cars behind a figure; what lacks its other half is refused', async () => {
    expect((await list('?zone=sill_inner&side=left')).body.jobs).toBe(10);
    expect((await list('?zone=sill_inner&side=right')).body.jobs).toBe(0);
    expect((await list('?product=CW1&package=full')).body.jobs).toBe(10);
    expect((await list('?product=CW1&use=over')).body.jobs).toBe(0);
    const refused = await list('?side=left&use=under');
    expect(refused.status).toBe(422);
    expect(refused.body.problems.map(({ path }: { path: string }) => path)).toEqual([
      ...['/query/side', '/query/use'],
    ]);
    const unknown = await list('?product=NONE');
    expect([unknown.status, unknown.body.problems[0].path]).toEqual([422, '/query/product']);
  });
});
