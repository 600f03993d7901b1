import type { Scope } from '#db/scope';
import type { RotAnswer } from '#shared/contracts/rot';
import type { SentJob } from '#shared/domain/normalise-job';
import { ZONES } from '#shared/domain/vocabulary';
import { carAged, found, headOfficeOf, makeRotStore } from '../../../test/support/rot-store';
import type { SmallStore } from '../../../test/support/small-store';
import { answerRot } from './answer-rot';

let small: SmallStore;
beforeAll(async () => (small = await makeRotStore()), 30_000);
afterAll(() => small.close());

function ask(
  scope: Scope,
  from: string,
  { to = from, ...filters }: { to?: string; packageIds?: number[]; bodyTypes?: ['van'] } = {},
): RotAnswer {
  const { store } = small;
  const question = { period: { from, to }, filters };
  return answerRot(store.scoped(scope), question, store.reference(scope));
}
const headOffice = (): Scope => headOfficeOf(small);

describe('answerRot', () => {
  it('given no car at all, has the regions of the scope and nothing to say of them', () => {
    const answer = ask(small.scope('AAA', 'DDD'), '2019-01-01');
    const nothing = { cars: 0, withRot: 0, share: null };
    expect(answer).toMatchObject({
      ...{ jobs: 0, reference: 'scope', bands: [], cells: [], zones: [], models: [] },
      overall: { ...nothing, lower: null, upper: null },
      openedUp: { worked: 0, holed: 0, share: null, lower: null, upper: null },
    });
    expect(answer.regions).toEqual(
      ['COAST', 'HILLS'].map((region) => ({
        ...{ region, ...nothing, adjustedShare: null, adjustedLower: null, adjustedUpper: null },
        bandsLeftOut: [],
        corrosionRateUmPerYear: region === 'HILLS' ? expect.closeTo(17.87070367859837, 9) : null,
        corrosivityCategory: region === 'HILLS' ? 'C2' : null,
        outsideFittedRange: false,
      })),
    );
  });

  it('given a climate outside the fitted range, says so beside the value (rule 36)', () => {
    const [plain] = ask(small.scope('GGG'), '2019-01-01').regions;
    expect(plain).toMatchObject({ outsideFittedRange: true, corrosivityCategory: 'C2' });
  });

  it('given one car, counts it everywhere and withholds every share but the steadied one (rules 13 and 34)', async () => {
    const on = '2019-02-01';
    await small.putJob('AAA', 'one', carAged(on, 12, { findings: [found('floor')] }));
    const answer = ask(small.scope('AAA'), on);
    const one = { cars: 1, withRot: 1, share: null, lower: null, upper: null };
    expect(answer.overall).toEqual(one);
    expect(answer.bands).toEqual([{ ageBand: '10-14', ...one, referenceShare: null }]);
    expect(answer.cells).toEqual([{ ageBand: '10-14', region: 'COAST', ...one }]);
    expect(answer.zones).toHaveLength(15);
    expect(answer.models).toEqual([
      {
        ...{ make: 'Vela', model: 'Ono', ageBand: '10-14', cars: 1, withRot: 1, share: null },
        ...{ shrunkShare: 1, lower: expect.closeTo(0.206549, 6), upper: 1, pooled: true },
      },
    ]);
  });

  it('given rot on several places of a zone, counts the car once in it and once a side (rule 32)', async () => {
    const on = '2019-02-02';
    const places = [
      found('sill_outer'),
      found('sill_outer', { seenAs: 'surface', workedAs: 'holed' }),
      found('sill_outer', { side: 'right' }),
      found('tailgate', { side: 'right' }),
      found('floor', { seenAs: 'surface' }),
    ];
    await small.putJob('AAA', 'z-0', carAged(on, 12, { findings: places }));
    for (const n of [1, 2, 3, 4]) await small.putJob('AAA', `z-${n}`, carAged(on, 12));
    const zones = ask(small.scope('AAA'), on).zones;
    const told = (name: string) => {
      const { withRot, share, sides } = zones.find(({ zone }) => zone === name)!;
      return [withRot, share, Object.fromEntries(sides.map((one) => [one.side, one.withRot]))];
    };
    expect(told('sill_outer')).toEqual([1, 0.2, { left: 1, right: 1 }]);
    // A side that a car does not have by its build is told only where something was found there.
    expect(told('tailgate')).toEqual([1, 0.2, { right: 1, centre: 0 }]);
    expect(told('floor')).toEqual([0, 0, { left: 0, right: 0 }]);
    expect(zones.map(({ zone }) => zone)).toEqual(ZONES);
  });

  it('given five cars without rot, has a share of 0 with an interval that begins there', async () => {
    const on = '2019-02-03';
    for (const n of [0, 1, 2, 3, 4]) await small.putJob('DDD', `n-${n}`, carAged(on, 3));
    const [region] = ask(small.scope('DDD'), on).regions;
    // One band alone: the exact Poisson limit of no event in five, 3.688879 / 5 (F. Garwood, Biometrika 28 (1936)).
    expect(region).toMatchObject({ share: 0, adjustedShare: 0, adjustedLower: 0 });
    expect(region?.adjustedUpper).toBeCloseTo(0.737776, 6);
  });

  it('given rot under every car, lets no adjusted share reach beyond 1 (rule 35)', async () => {
    const on = '2019-02-04';
    for (const n of [0, 1, 2, 3, 4]) {
      await small.putJob('DDD', `all-${n}`, carAged(on, 3, { findings: [found('floor')] }));
    }
    const [region] = ask(small.scope('DDD'), on).regions;
    expect(region).toMatchObject({ adjustedShare: 1, adjustedUpper: 1 });
  });

  it('given a region without cars of an age, leaves that age out and stretches the others (rule 35)', async () => {
    const on = '2019-02-05';
    const put = async (branch: string, years: number, cars: number, rotten: number) => {
      for (let n = 0; n < cars; n += 1) {
        const findings = n < rotten ? [found('floor')] : [];
        await small.putJob(branch, `mix-${years}-${n}`, carAged(on, years, { findings }));
      }
    };
    await put('AAA', 2, 4, 1);
    await put('AAA', 7, 2, 1);
    await put('DDD', 2, 2, 0);
    await put('DDD', 22, 12, 9);
    const [coast, hills] = ask(small.scope('AAA', 'DDD'), on).regions;
    // Six cars of 0-4 and two of 5-9 stand for eight of the twenty: 6/8 × 1/4 + 2/8 × 1/2.
    expect(coast).toMatchObject({ bandsLeftOut: ['20+'], adjustedShare: 0.3125 });
    // Six of 0-4 and twelve of 20+: 6/18 × 0 + 12/18 × 9/12.
    expect(hills).toMatchObject({ bandsLeftOut: ['5-9'] });
    expect(hills?.adjustedShare).toBeCloseTo(0.5, 14);
  });

  it('given a model spelled in several ways, is one under the newest spelling (rule 33)', async () => {
    const day = (n: number): string => `2019-03-0${n}`;
    const spelled = (on: string, make: string, model: string): SentJob => {
      const plain = carAged(on, 12);
      return { ...plain, vehicle: { ...plain.vehicle, make, model } };
    };
    await small.putJob('AAA', 's-1', spelled(day(2), 'VELA', 'Ono'));
    await small.putJob('AAA', 's-2', spelled(day(3), 'vela', ' ONO '));
    await small.putJob('BBB', 's-3', spelled(day(3), 'Vela', 'ono'));
    await small.putJob('AAA', 's-4', spelled(day(1), 'Velà', 'Ono'));
    await small.putJob('AAA', 's-5', spelled(day(1), 'Aru', 'Zet'));
    const models = (from: string, to: string, ...codes: string[]) =>
      ask(small.scope(...codes), from, { to }).models.map(({ make, model, cars }) =>
        [make, model, cars].join('/'),
      );
    // Of two cars completed on one day, the one that came in last.
    expect(models(day(1), day(9), 'AAA', 'BBB')).toEqual(['Aru/Zet/1', 'Vela/ono/3', 'Velà/Ono/1']);
    expect(models(day(2), day(2), 'AAA', 'BBB')).toEqual(['VELA/Ono/1']);
    expect(models(day(1), day(9), 'BBB')).toEqual(['Vela/ono/1']);
  });

  it('given bubbles that were worked, tells how many opened into holes from five on (rule 46)', async () => {
    const on = '2019-02-06';
    const opened = [
      found('floor', { workedAs: 'holed' }),
      found('floor', { workedAs: 'holed' }),
      found('boot_floor', { workedAs: 'surface' }),
      found('tailgate', { workedAs: 'bubbling' }),
      found('tailgate'),
      found('tailgate', { seenAs: 'holed', workedAs: 'holed' }),
    ];
    await small.putJob('AAA', 'b-1', carAged(on, 12, { findings: opened }));
    const nothing = { share: null, lower: null, upper: null };
    expect(ask(small.scope('AAA'), on).openedUp).toEqual({ worked: 4, holed: 2, ...nothing });
    await small.putJob(
      'AAA',
      'b-2',
      carAged(on, 1, { findings: [found('floor', { workedAs: 'holed' })] }),
    );
    expect(ask(small.scope('AAA'), on).openedUp).toMatchObject({ worked: 5, holed: 3, share: 0.6 });
  });

  it('given five others with cars after the filters, compares with the network, given four with the scope (rule 21)', async () => {
    const on = '2019-02-07';
    for (const branch of ['BBB', 'CCC', 'DDD', 'EEE', 'FFF']) {
      const vehicle = {
        ...carAged(on, 2).vehicle,
        ...(branch === 'FFF' && { bodyType: 'suv' as const }),
      };
      await small.putJob(branch, 'ref', carAged(on, 2, { vehicle, findings: [found('floor')] }));
    }
    for (const n of [1, 2, 3, 4, 5]) await small.putJob('AAA', `ref-${n}`, carAged(on, 2));
    const share = ({ reference, bands }: RotAnswer) => [reference, bands[0]?.referenceShare];
    const own = small.scope('AAA');
    expect(share(ask(own, on))).toEqual(['network', 0.5]);
    expect(share(ask(own, on, { bodyTypes: ['van'] }))).toEqual(['scope', 0]);
    // Narrowing within what one may see makes no stranger of one's own branches.
    const two = small.scope('AAA', 'BBB');
    // … and what is compared with does not change with the rows chosen.
    expect(share(ask(two.narrow({ branch: ['AAA'] }), on))).toEqual(['scope', 1 / 6]);
    expect(
      share(ask(headOffice().narrow({ branch: ['AAA'] }), on, { bodyTypes: ['van'] })),
    ).toEqual(['network', 4 / 9]);
  });
});
