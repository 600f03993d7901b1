import { nextReference, proposeReference } from './claim-reference';

describe('nextReference', () => {
  it.each([
    ['W-2026-02-02', 'W-2026-02-02-2'],
    ['W-2026-02-02-2', 'W-2026-02-02-3'],
    ['W-2026-02-02-9', 'W-2026-02-02-10'],
  ])('after %s, is %s', (claimRef, next) => {
    expect(nextReference(claimRef)).toBe(next);
  });

  it.each(['W-0417', '2026-02-02', 'w-2026-02-02', 'W-2026-02-02-x'])(
    'after %s, which somebody wrote themselves, is none',
    (claimRef) => {
      expect(nextReference(claimRef)).toBeUndefined();
    },
  );

  it('after the one proposed, follows on', () => {
    expect(nextReference(proposeReference('2026-02-02'))).toBe('W-2026-02-02-2');
  });
});
