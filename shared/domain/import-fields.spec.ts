import { headingKey } from './import-field';
import { importFields, matchHeadings } from './import-fields';

const CATALOGUE = {
  products: [
    { code: 'CW1', name: 'Cavity wax' },
    { code: '10', name: 'Ten' },
  ],
  packages: [{ code: 'full', name: 'Full' }],
};
const JOBS = importFields('jobs', CATALOGUE);
const matched = (headings: string[], fields = JOBS): (string | undefined)[] =>
  matchHeadings(headings, fields).map((field) => field?.field);

describe('The fields of a file', () => {
  it.each(['jobs', 'claims'] as const)('given %s, have names that are theirs alone', (kind) => {
    const owner = new Map<string, string>();
    for (const { field, label, names, hint } of importFields(kind, CATALOGUE)) {
      expect([label, hint].every((text) => text.length > 0)).toBe(true);
      expect(field.length).toBeLessThanOrEqual(64);
      for (const name of new Set([field, label, ...names].map(headingKey))) {
        expect([name, owner.get(name)]).toEqual([name, undefined]);
        owner.set(name, field);
      }
    }
  });

  it('given headings as the JSON names them or in words, are matched without regard to case and spaces', () => {
    expect(
      matched([
        'estimate.priceCents',
        'ACTUAL stages strip',
        'Completed  on',
        'completed_on',
        'cw1 ML',
        'vehicle make',
        'ml 1',
        'Product 1',
      ]),
    ).toEqual([
      'estimate.priceCents',
      'actual.strip',
      'completedOn',
      undefined,
      'product.CW1.ml',
      'vehicle.make',
      'ml.1',
      'product.1',
    ]);
  });

  it('given two columns for one thing, give it to the first', () => {
    expect(matched(['Price', 'estimate.priceCents', 'why refused', ''])).toEqual([
      'estimate.price',
      undefined,
      undefined,
      undefined,
    ]);
  });
});
