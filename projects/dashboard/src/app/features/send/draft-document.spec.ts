import { type DraftDocument, keyedPath, pathPart, valueAt, withValue } from './draft-document';

const document: DraftDocument = {
  jobRef: '0417',
  vehicle: { make: 'Velder' },
  products: [{ product: 'CW1', ml: 3000 }],
  findings: [{ ref: 'sill_inner/left/1', zone: 'sill_inner', side: 'left' }],
};
const FINDING = `/findings${pathPart('sill_inner/left/1')}`;

describe('valueAt', () => {
  it('of a path, given products and findings by key, reads what stands there', () => {
    expect(valueAt(document, '/vehicle/make')).toBe('Velder');
    expect(valueAt(document, '/products/CW1/ml')).toBe(3000);
    expect(valueAt(document, `${FINDING}/side`)).toBe('left');
    expect(valueAt(document, '/products/UW1/ml')).toBeUndefined();
    expect(valueAt(document, '/actual/stages/strip')).toBeUndefined();
  });
});

describe('withValue', () => {
  it('at a new path, given groups that are not there yet, makes them and leaves the former document alone', () => {
    const next = withValue(document, '/actual/stages/strip', 90);
    expect(next.actual).toEqual({ stages: { strip: 90 } });
    expect(document.actual).toBeUndefined();
  });

  it('of the last field of a group, given nothing, takes the group away too', () => {
    const next = withValue(document, '/vehicle/make', undefined);
    expect(next).not.toHaveProperty('vehicle');
    expect(next.jobRef).toBe('0417');
  });

  it('of a product, given an amount, adds its line; given nothing, takes the line off', () => {
    const more = withValue(document, '/products/UW1/ml', 4200);
    expect(more.products).toEqual([
      { product: 'CW1', ml: 3000 },
      { product: 'UW1', ml: 4200 },
    ]);
    const less = withValue(more, '/products/CW1/ml', undefined);
    expect(less.products).toEqual([{ product: 'UW1', ml: 4200 }]);
    expect(withValue(less, '/products/UW1/ml', undefined)).not.toHaveProperty('products');
  });

  it('of a consumable, given its kind, changes its quantity and leaves its price', () => {
    const priced = withValue({}, '/consumables', [
      { kind: 'trim_clip', quantity: 2, unitCostCents: 80 },
    ]);
    expect(withValue(priced, '/consumables/trim_clip/quantity', 3).consumables).toEqual([
      { kind: 'trim_clip', quantity: 3, unitCostCents: 80 },
    ]);
  });

  it('of a finding, given a reference with slashes, changes that one and keeps it with only its reference left', () => {
    const next = withValue(document, `${FINDING}/seenAs`, 'bubbling');
    expect(next.findings?.[0]?.seenAs).toBe('bubbling');
    const bare = withValue(
      { findings: [{ ref: 'a/1', note: 'x' }] },
      '/findings/a~11/note',
      undefined,
    );
    expect(bare.findings).toEqual([{ ref: 'a/1' }]);
    expect(withValue(document, FINDING, undefined)).not.toHaveProperty('findings');
  });

  it('of a list by place, given nothing, closes the gap', () => {
    const extras = withValue({}, '/agreedExtras', [
      { on: '2026-02-01', minutes: 30 },
      { on: '2026-02-02', minutes: 60 },
    ]);
    expect(withValue(extras, '/agreedExtras/0', undefined).agreedExtras).toEqual([
      { on: '2026-02-02', minutes: 60 },
    ]);
  });
});

describe('keyedPath', () => {
  it('of a path by place, given keyed lists, names the item by its key', () => {
    expect(keyedPath(document, '/findings/0/workedAs')).toBe(`${FINDING}/workedAs`);
    expect(keyedPath(document, '/products/0/ml')).toBe('/products/CW1/ml');
    expect(keyedPath(document, '/agreedExtras/1/on')).toBe('/agreedExtras/1/on');
    expect(keyedPath(document, '/findings')).toBe('/findings');
  });
});
