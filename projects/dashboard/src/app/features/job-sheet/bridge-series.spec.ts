import { bridgeSeries, largestStep } from './bridge-series';

// Invented; the steps add up to the cent: 379.00 + 70.00 − 50.40 − 186.00 − 3.60 − 120.00 − 6.00 = 83.00.
const BRIDGE = {
  expectedMarginCents: 37900,
  priceCents: 7000,
  plannedLabourCents: -5040,
  rotLabourCents: -18600,
  productCents: -360,
  consumablesCents: -12000,
  feeCents: -600,
  marginCents: 8300,
};

describe('bridgeSeries', () => {
  it('of a bridge gives eight rows whose steps lead from expected to kept', () => {
    const { rows } = bridgeSeries(BRIDGE);
    expect(rows).toHaveLength(8);
    const steps = rows.filter((row) => row.kind === 'step');
    const sum = steps.reduce((total, row) => total + row.value, BRIDGE.expectedMarginCents);
    expect(sum).toBe(BRIDGE.marginCents);
    expect(rows.find((row) => row.key === 'rotLabourCents')).toMatchObject({
      text: '−186.00',
      role: 'loss',
      strong: true,
    });
    expect(rows.find((row) => row.key === 'priceCents')).toMatchObject({
      text: '+70.00',
      role: 'gain',
      strong: false,
    });
  });

  it('says the largest step in its summary', () => {
    expect(bridgeSeries(BRIDGE).summary).toBe(
      'Expected 379.00, kept 83.00; the largest step is rot labour, −186.00.',
    );
  });
});

describe('largestStep', () => {
  it('where nothing changed names none', () => {
    const still = Object.fromEntries(Object.keys(BRIDGE).map((key) => [key, 0])) as typeof BRIDGE;
    expect(largestStep(still)).toBeUndefined();
  });
});
