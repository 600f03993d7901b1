import { claimCautions } from './claim-cautions';
import { emptyClaim } from './typed-claim';

const at = (zone: string, more: object = {}) => ({ ...emptyClaim('2026-02-02'), zone, ...more });
const dangers = (...of: Parameters<typeof claimCautions>): string[] =>
  claimCautions(...of).map(({ danger }) => danger);
const ROT = {
  ref: 'a',
  zone: 'tailgate',
  side: 'centre',
  seenAs: 'holed',
  structural: true,
  action: 'patched',
} as const;

describe('claimCautions', () => {
  it('of rust where most cars bear load, says that the car may not be fit for the road', () => {
    expect(claimCautions(at('sill_outer'), [])[0]?.words).toContain('may not be fit for the road');
  });

  it('of rust where this car was found to bear load, says so too', () => {
    expect(dangers(at('tailgate'), [])).toEqual([]);
    expect(dangers(at('tailgate', { side: 'centre' }), [ROT])).toEqual(['Rot that bears load']);
    expect(dangers(at('tailgate', { side: 'left' }), [ROT])).toEqual([]);
  });

  it('of a jacking point, warns of lifting there', () => {
    expect(dangers(at('jacking_point'), [])).toContain('Lifting');
  });

  it('of work that takes time, warns of fire', () => {
    expect(dangers(at('door_bottom', { labourMinutes: '30' }), [])).toEqual(['Fire']);
  });

  it('of no place yet, says nothing', () => {
    expect(dangers(at(''), [ROT])).toEqual([]);
  });
});
