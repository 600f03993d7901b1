import type { TestApp } from './app';
import { makeSmallNetwork, validJob, type SmallNetwork } from './small-network';

/** A small network with a further product, of unknown cost, and such cars in three of its branches. */
export async function makeCostedNetwork(app: TestApp): Promise<SmallNetwork> {
  const network = await makeSmallNetwork(app);
  const token = network.office;
  const product = { name: 'Underbody wax', kind: 'underbody_wax' };
  expect((await app.call('put', '/api/products/UW1', { token, body: product })).status).toBe(201);
  for (const [n, branch] of ['AAA', 'BBB', 'CCC'].entries()) {
    const path = `/api/branches/${branch}/jobs/batch`;
    const sent = await app.call('post', path, { token, body: { jobs: carsOf(n) } });
    expect(sent.body.counts).toMatchObject({ rejected: 0 });
  }
  return network;
}

/** Cars of every kind that costs meet: unbilled, with no estimate, of no norm, with a product of unknown cost, with a piece priced by the network. */
function carsOf(seed: number): object[] {
  return Array.from({ length: 12 }, (_, n) => ({
    jobRef: `car-${n}`,
    ...validJob({
      startedOn: '2025-11-20',
      bookedOn: '2025-11-20',
      completedOn: `2025-1${n % 3 === 2 ? 2 : 1}-2${(n + seed) % 9}`,
      invoice: n % 4 === 0 ? null : { totalCents: 50_000 + 777 * n + seed },
      ...(n % 5 === 0 && { estimate: undefined }),
      ...(n % 6 === 1 && { package: 'cavity' }),
      products: [
        { product: 'CW1', ml: 3000 + 101 * n },
        ...(n === 7 ? [{ product: 'UW1', ml: 333 }] : []),
      ],
      consumables: n === 8 ? [{ kind: 'blanking_plug', quantity: 3 }] : [],
      actual: { stages: { strip: 61 + n, apply: 97 + seed, repair: 185 } },
    }),
  }));
}
