import { SEND_STEPS, stepOf, stepOfPath, stepWords } from './send-steps';
import { stepState } from './step-state';

describe('steps of the form', () => {
  it('named, given each, count six and say when all are through', () => {
    expect(stepWords('findings')).toBe('4 of 6, findings');
    expect(stepWords('review')).toBe('All 6, look it over');
  });

  it('opened, given an address, what was kept, or neither, stand where one was', () => {
    expect(stepOf('product', 0)).toBe('product');
    expect(stepOf(undefined, 3)).toBe('findings');
    expect(stepOf('no-step', 99)).toBe('car');
  });

  it('of a field, given its path, are where the field stands', () => {
    const steps = {
      '/jobRef': 'car',
      '/vehicle/make': 'car',
      '/estimate/priceCents': 'package',
      '/actual/stages/repair': 'stages',
      '/agreedExtras/0/on': 'stages',
      '/findings': 'findings',
      '/checks/driedOut': 'product',
      '/invoice/totalCents': 'invoice',
      '/notes': 'invoice',
    };
    for (const [path, step] of Object.entries(steps)) expect(stepOfPath(path)).toBe(step);
  });

  it('filled in, given nothing, some and all of a car, are empty, begun and done', () => {
    const vehicle = { make: 'Velder', model: 'Tessock', bodyType: 'hatchback' } as const;
    expect(stepState({}, 'car')).toBe('empty');
    expect(stepState({ vehicle }, 'car')).toBe('begun');
    const car = { jobRef: '1', vehicle: { ...vehicle, firstRegistered: '2009-05' } };
    expect(stepState(car, 'car')).toBe('done');
  });

  it('without findings or a bill, given a clean car, are open, not missing', () => {
    expect(stepState({}, 'findings')).toBe('open');
    expect(stepState({}, 'invoice')).toBe('open');
    expect(SEND_STEPS.map((step) => stepState({}, step))).not.toContain('done');
  });
});
