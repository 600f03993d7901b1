import type { ListFilters } from '#db/queries/job-list';
import { placesMask } from '#shared/domain/rot-places';
import { unbilledJob } from '../../../test/support/kept-job';
import { SmallStore } from '../../../test/support/small-store';
import { everyJob, listJobs } from './list-jobs';

const DAY = '2026-01-05';
let small: SmallStore;
let unknownId: number;
beforeAll(async () => {
  small = await SmallStore.make();
  const finding = (
    zone: 'floor' | 'tailgate',
    side: 'left' | 'right' | 'centre',
    seenAs = 'holed',
  ) => ({ zone, side, seenAs, structural: false, action: 'treated' }) as never;
  const rotten: Record<string, unknown[]> = {
    left: [finding('floor', 'left'), finding('tailgate', 'right', 'surface')],
    both: [finding('floor', 'left'), finding('floor', 'right', 'bubbling')],
    // The highest bit of all.
    tail: [finding('tailgate', 'centre')],
  };
  for (const [ref, findings] of Object.entries(rotten)) {
    await small.putJob('AAA', ref, { ...unbilledJob(DAY), findings } as never);
  }
  // A van's norm is 4000 ml: the edges are 2800 and 5200.
  for (const ml of [0, 2799, 2800, 5200, 5201]) {
    const products = [{ product: 'CW1', ml }];
    await small.putJob('BBB', `ml-${ml}`, { ...unbilledJob(DAY), products });
  }
  // Without a norm: never under or over.
  const cavity = { ...unbilledJob(DAY), package: 'cavity' };
  await small.putJob('BBB', 'no-norm', { ...cavity, products: [{ product: 'CW1', ml: 9 }] });
  await small.putJob('BBB', 'other', { ...cavity, products: [{ product: 'UW1', ml: 9 }] });
  unknownId = small.store.state.productId('UW1') ?? 0;
});
afterAll(() => small.close());

function found(filters: ListFilters): string[] {
  const db = small.store.scoped(small.scope('AAA', 'BBB'));
  const asked = { filters, sort: 'completed', todayByBranch: {}, money: 'seen' } as const;
  const page = listJobs(db, { ...asked, after: null, limit: 200 });
  expect(page.jobs).toBe(page.items.length);
  expect([...everyJob(db, asked)].flat()).toEqual(page.items);
  return page.items.map(({ jobRef }) => jobRef).sort();
}
const productId = () => small.store.state.productId('CW1') ?? 0;

describe('listJobs, by what lies underneath', () => {
  it('given a zone, finds rot on any side of it; given a side too, only there', () => {
    expect(found({ rotPlaces: placesMask('floor') })).toEqual(['both', 'left']);
    expect(found({ rotPlaces: placesMask('floor', 'right') })).toEqual(['both']);
    expect(found({ rotPlaces: placesMask('floor', 'centre') })).toEqual([]);
    expect(found({ rotPlaces: placesMask('tailgate') })).toEqual(['tail']);
    expect(found({ rotPlaces: placesMask('tailgate', 'centre') })).toEqual(['tail']);
  });

  it('given a product, finds the cars on which any of it went in', () => {
    expect(found({ productId: productId() })).toEqual([
      ...['ml-2799', 'ml-2800', 'ml-5200', 'ml-5201', 'no-norm'],
    ]);
    expect(found({ productId: unknownId })).toEqual(['other']);
  });

  it('given under or over, counts cars with a norm strictly past its edge, those that list nothing as 0 ml (rule 37)', () => {
    expect(found({ productId: productId(), productUse: 'under' })).toEqual([
      ...['both', 'left', 'ml-0', 'ml-2799', 'tail'],
    ]);
    expect(found({ productId: productId(), productUse: 'over' })).toEqual(['ml-5201']);
    expect(found({ productId: unknownId, productUse: 'under' })).toEqual([]);
  });

  it('given several filters, finds what all of them find', () => {
    const rotPlaces = placesMask('floor');
    expect(found({ productId: productId(), productUse: 'under', rotPlaces })).toEqual([
      ...['both', 'left'],
    ]);
  });
});
