import fc from 'fast-check';
import { placesMask, placesOf, rotPlaces } from './rot-places';
import { CONDITIONS, SIDES, ZONES } from './vocabulary';

const finding = fc.record({
  zone: fc.constantFrom(...ZONES),
  side: fc.constantFrom(...SIDES),
  seenAs: fc.constantFrom(...CONDITIONS),
  workedAs: fc.constantFrom(...CONDITIONS),
});

describe('rotPlaces', () => {
  it('given any findings, holds exactly the places where one is rot, each once', () => {
    fc.assert(
      fc.property(fc.array(finding, { maxLength: 60 }), (findings) => {
        const rotten = new Set(
          findings
            .filter(({ seenAs, workedAs }) => seenAs !== 'surface' || workedAs !== 'surface')
            .map(({ zone, side }) => `${zone} ${side}`),
        );
        const places = rotPlaces(findings);
        expect(Number.isSafeInteger(places)).toBe(true);
        expect(
          placesOf(places)
            .map(({ zone, side }) => `${zone} ${side}`)
            .sort(),
        ).toEqual([...rotten].sort());
      }),
    );
  });

  it('given a rotten place everywhere, is the number of all 45 bits', () => {
    const all = ZONES.flatMap((zone) =>
      SIDES.map((side) => ({ zone, side, seenAs: 'holed' as const })),
    );
    expect(rotPlaces(all)).toBe(2 ** 45 - 1);
  });
});

describe('placesMask', () => {
  it('given a zone without a side, holds its three sides', () => {
    expect(placesOf(placesMask('tailgate'))).toEqual(
      SIDES.map((side) => ({ zone: 'tailgate', side })),
    );
    expect(placesOf(placesMask('floor', 'right'))).toEqual([{ zone: 'floor', side: 'right' }]);
  });
});
