import { TestApp } from '../support/app';
import { callAs } from '../support/call-as';
import { makeCostedNetwork } from '../support/costed-cars';
import { validJob, type SmallNetwork } from '../support/small-network';

jest.setTimeout(60_000);

let app: TestApp;
let network: SmallNetwork;
beforeAll(async () => {
  app = await TestApp.start();
  network = await makeCostedNetwork(app);
});
afterAll(() => app.stop());

const { call, put, get } = callAs(
  () => app,
  () => network.office,
);
describe('The medians to take a norm from', () => {
  it('given five cars and more, tells median, P10 and P90 of what the cars list', async () => {
    const { body } = await call('get', '/api/packages/cavity/norms/hatchback/medians');
    // Cars 1 and 7 of three branches: 3101 ml and 3707 ml, three each.
    expect(body).toEqual({
      from: '2025-02-10',
      to: '2026-02-02',
      cars: 6,
      products: [
        { product: 'CW1', cars: 6, medianMl: 3404, p10Ml: 3101, p90Ml: 3707 },
        { product: 'UW1', cars: 3, medianMl: null, p10Ml: null, p90Ml: null },
      ],
    });
  });

  it('given no car, tells none; given no such package, answers 404', async () => {
    expect((await get('/api/packages/full/norms/classic/medians')).products).toEqual([]);
    expect((await call('get', '/api/packages/nope/norms/van/medians')).status).toBe(404);
    expect((await call('get', '/api/packages/full/norms/boat/medians')).status).toBe(422);
  });
});

describe('Taking a product or a package out', () => {
  it('given jobs, norms and costs that refer to it, answers 409 and says what does', async () => {
    const product = await call('delete', '/api/products/CW1');
    expect([product.status, product.body.detail]).toEqual([
      409,
      'The product CW1 stays: 36 jobs, 1 norm and 1 dated cost refer to it.',
    ]);
    const entry = await call('delete', '/api/packages/cavity');
    expect([entry.status, entry.body.detail]).toEqual([
      409,
      'The package cavity stays: 6 jobs refer to it.',
    ]);
    expect((await get('/api/catalogue')).products).toHaveLength(2);
  });

  it('given only a voided job or an older revision that names it, keeps it all the same', async () => {
    await put('/api/products/OLD1', { name: 'Old', kind: 'cavity_wax' });
    await put('/api/packages/old_one', { name: 'Old', warrantyMonths: 1 });
    const at = '/api/branches/AAA/jobs/of-old';
    await call('put', at, validJob({ package: 'old_one', products: [{ product: 'OLD1', ml: 5 }] }));
    await call('put', at, validJob({ package: 'old_one' }));
    await call('delete', at);
    expect((await call('delete', '/api/products/OLD1')).body.detail).toContain('1 job refers');
    expect((await call('delete', '/api/packages/old_one')).status).toBe(409);
    expect((await call('post', `${at}/restore`)).status).toBe(200);
  });

  it('given a booking, keeps its package until it is removed', async () => {
    await put('/api/packages/booked', { name: 'Booked', warrantyMonths: 1 });
    const at = '/api/branches/AAA/bookings/of-booked';
    await call('put', at, { expectedOn: '2026-03-01', package: 'booked', bodyType: 'suv' });
    expect((await call('delete', '/api/packages/booked')).body.detail).toContain(
      '1 booking refers',
    );
    await call('delete', at);
    expect((await call('delete', '/api/packages/booked')).status).toBe(204);
  });

  it('given nothing that refers to it, is gone at once, said in the trail, and can be made anew', async () => {
    await put('/api/products/TYPO', { name: 'Typo', kind: 'cavity_wax' });
    expect((await call('delete', '/api/products/TYPO')).status).toBe(204);
    expect((await call('delete', '/api/products/TYPO')).status).toBe(404);
    const sent = await call(
      'put',
      '/api/branches/AAA/jobs/typo',
      validJob({ products: [{ product: 'TYPO', ml: 1 }] }),
    );
    expect([sent.status, sent.body.problems[0].path]).toEqual([422, '/products/0/product']);
    const [event] = (await get('/api/audit?action=product.remove')).items;
    expect(event).toMatchObject({
      subject: '/products/TYPO',
      changes: expect.arrayContaining([{ path: '/name', before: 'Typo', after: null }]) as unknown,
    });
    expect((await put('/api/products/TYPO', { name: 'No typo', kind: 'cavity_wax' })).status).toBe(
      201,
    );
  });

  it('given a job that comes between the counting and the deletion, keeps it', async () => {
    await put('/api/products/RACE', { name: 'Race', kind: 'cavity_wax' });
    const [removed, sent] = await Promise.all([
      call('delete', '/api/products/RACE'),
      call(
        'put',
        '/api/branches/AAA/jobs/race',
        validJob({ products: [{ product: 'RACE', ml: 1 }] }),
      ),
    ]);
    expect([
      [204, 422],
      [409, 201],
    ]).toContainEqual([removed.status, sent.status]);
  });
});
