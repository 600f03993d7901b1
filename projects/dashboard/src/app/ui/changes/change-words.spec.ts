import { formatDate } from '../format';
import { changeRows } from './change-rows';
import { fieldWords } from './field-words';
import type { KnownNames } from './known-names';
import { valueWords } from './value-words';

const KNOWN: KnownNames = {
  currency: 'EUR',
  productName: (code) => (code === 'CW1' ? 'Cavity wax amber' : code),
  packageName: (code) => (code === 'full' ? 'Full protection' : code),
  branchName: (code) => (code === 'HAV' ? 'Havnsund' : code),
  regionName: (code) => code,
  placeOf: (ref) => (ref === 'f1' ? 'floor, right' : undefined),
};
const field = (path: string) => fieldWords(path, KNOWN);
const value = (path: string, held: unknown) => valueWords(path, held, KNOWN);

describe('fieldWords', () => {
  it.each([
    ['/findings/sill_inner~1left~11/workedAs', 'sill, inner, left: worked as'],
    ['/findings/sill_inner~1left~12/chargedCents', 'sill, inner, left, finding 2: charged for it'],
    ['/findings/f1/seenAs', 'floor, right: seen as'],
    ['/findings/f2/note', 'finding f2: note'],
    ['/actual/stages/strip', 'strip: worked'],
    ['/estimate/stages/apply', 'apply: estimated'],
    ['/estimate/priceCents', 'quoted price'],
    ['/products/CW1/ml', 'Cavity wax amber: used'],
    ['/products/CW1:2/ml', 'Cavity wax amber, line 2: used'],
    ['/norms/CW1', 'Cavity wax amber'],
    ['/norms/0/ml', 'line 1: used'],
    ['/consumables/trim_clip:2/quantity', 'trim clips, line 2: number used'],
    ['/consumables/trim_clip/quantity', 'trim clips: number used'],
    ['/consumables/other/unitCostCents', 'other consumables: cost of one'],
    ['/agreedExtras/0/priceCents', 'agreed extra 1: price'],
    ['/checks/bothDirections', 'each void sprayed from both ends'],
    ['/workshop/temperatureC', 'workshop: temperature'],
    ['/invoice/totalCents', 'invoice total before tax'],
    ['/vehicle/odometerKm', 'odometer'],
    ['/completedOn', 'finished'],
    ['/boughtInCents', 'bought-in'],
    ['/targetMarginShare', 'target margin'],
    ['/somethingNew/ofTomorrow', 'something new: of tomorrow'],
    ['/constructor', 'constructor'],
    ['', 'text'],
  ])('of %s, says %s', (path, words) => {
    expect(field(path)).toBe(words);
  });
});

describe('valueWords', () => {
  it.each([
    ['/invoice/totalCents', 87_050, '€870.50'],
    ['/actual/stages/repair', 95, '1\u202fh 35\u202fmin'],
    ['/findings/a/repairMinutes', 40, '40\u202fmin'],
    ['/products/CW1/ml', 4_210, '4,210\u202fml'],
    ['/norms/CW1', 3_900, '3,900\u202fml'],
    ['/completedOn', '2026-01-28', formatDate('2026-01-28')],
    ['/vehicle/firstRegistered', '2012-05', 'May 2012'],
    ['/vehicle/bodyType', 'pickup', 'pick-up'],
    ['/findings/a/workedAs', 'holed', 'holed'],
    ['/findings/a/action', 'declined', 'declined by the owner'],
    ['/findings/a/structural', true, 'yes'],
    ['/checks/driedOut', 'na', 'does not apply'],
    ['/package', 'full', 'Full protection'],
    ['/branches', ['HAV', 'TAN'], 'Havnsund and TAN'],
    ['/branches', [], 'none'],
    ['/feeRate', 0.0725, '7.25\u202f%'],
    ['/workshop/temperatureC', 14.5, '14.5\u202f°C'],
    ['/climate', { temperatureC: 8, humidityPct: 80 }, 'temperature 8\u202f°C, humidity 80\u202f%'],
    ['/notes', '', 'nothing'],
    ['/notes', null, 'nothing'],
    ['/notes', 'Left sill seen again.', 'Left sill seen again.'],
    ['/findings/a/zone', 'constructor', 'constructor'],
  ])('of %s holding %j, says %s', (path, held, words) => {
    expect(value(path, held)).toBe(words);
  });

  it('of two amounts a millilitre apart, says two things', () => {
    expect(value('/products/CW1/ml', 4_200)).not.toBe(value('/products/CW1/ml', 4_201));
  });
});

describe('changeRows', () => {
  it('of a finding that came, takes its place from the change itself', () => {
    const rows = changeRows(
      [
        { path: '/findings/f9/zone', before: null, after: 'jacking_point' },
        { path: '/findings/f9/side', before: null, after: 'left' },
        { path: '/findings/f9/seenAs', before: null, after: 'bubbling' },
      ],
      KNOWN,
    );
    expect(rows.at(-1)).toEqual({
      path: '/findings/f9/seenAs',
      field: 'jacking point, left: seen as',
      before: 'nothing',
      after: 'bubbling',
    });
  });
});
