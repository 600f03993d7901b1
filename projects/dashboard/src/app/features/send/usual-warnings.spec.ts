import type { UsualCar } from '#shared/contracts/usual';
import { STAGES } from '#shared/domain/vocabulary';
import { type Usual, usualWarnings } from './usual-warnings';

const NOW = Date.parse('2026-02-02T10:00:00Z');

function car(more: Partial<UsualCar> = {}): UsualCar {
  return {
    basis: { kind: 'model_age', source: 'branch', cars: 42 },
    stages: STAGES.map((stage) => ({
      stage,
      ...(stage === 'strip'
        ? { low: 60, usual: 95, high: 180 }
        : { low: null, usual: null, high: null }),
    })),
    total: { low: 300, usual: 480, high: 900 },
    products: [{ product: 'CW1', low: 2500, usual: 3600, high: 5200 }],
    consumables: [{ kind: 'trim_clip', low: 0, usual: 3, high: 12 }],
    lastTime: null,
    ...more,
  };
}

function usual(more: Partial<Usual> = {}): Usual {
  return { car: car(), norms: [], productName: () => 'Cavity wax', now: NOW, ...more };
}

const plain = (words: string): string => words.replace(/\u202f/g, ' ');

describe('usualWarnings', () => {
  it('of minutes, given far more than such cars took, says the range and its cars', () => {
    const [warning] = usualWarnings({ actual: { stages: { strip: 300 } } }, usual());
    expect(warning?.path).toBe('/actual/stages/strip');
    expect(plain(warning!.words)).toBe(
      'Strip 5 h; 95 of 100 such cars took 1 h to 3 h (42 cars, this branch).',
    );
  });

  it('of minutes, given the ends of the range, no work at all, or a stage without a range, says nothing', () => {
    for (const strip of [0, 60, 180]) {
      expect(usualWarnings({ actual: { stages: { strip, clean: 2000 } } }, usual())).toEqual([]);
    }
  });

  it('of minutes, given a timer that runs, counts what it has run', () => {
    const startedAt = new Date(NOW - 100 * 60_000).toISOString();
    const document = { actual: { stages: { strip: 90 } }, timers: { strip: { startedAt } } };
    expect(usualWarnings(document, usual())).toHaveLength(1);
  });

  it('of a timer, given a night, asks whether it was left on', () => {
    const startedAt = new Date(NOW - 14 * 3_600_000).toISOString();
    const [warning] = usualWarnings({ timers: { refit: { startedAt } } }, usual());
    expect(plain(warning!.words)).toContain('The timer of refit has run for 14 h.');
  });

  it('of product, given a norm, is said below 70 % and above 130 % of it, not at them', () => {
    const norms = [{ product: 'CW1', ml: 4000 }];
    const said = (ml: number): number =>
      usualWarnings({ products: [{ product: 'CW1', ml }] }, usual({ norms })).length;
    expect([2799, 2800, 5200, 5201].map(said)).toEqual([1, 0, 0, 1]);
  });

  it('of product, given no norm, is held against what such cars took', () => {
    const [warning] = usualWarnings({ products: [{ product: 'CW1', ml: 6000 }] }, usual());
    expect(plain(warning!.words)).toBe(
      'Cavity wax 6.0 L; 95 of 100 such cars took 2.5 L to 5.2 L (42 cars, this branch).',
    );
  });

  it('of clips, given many, says so; the network is named where the cars are its', () => {
    const basis = { kind: 'body_age', source: 'network', cars: 312 } as const;
    const document = { consumables: [{ kind: 'trim_clip' as const, quantity: 30 }] };
    expect(usualWarnings(document, usual({ car: car({ basis }) }))[0]?.words).toBe(
      '30 trim clips; 95 of 100 such cars took 0 to 12 (312 cars, the network).',
    );
  });

  it('of anything, given no line, is silent but for the norm', () => {
    const document = { actual: { stages: { strip: 900 } } };
    expect(usualWarnings(document, usual({ car: undefined }))).toEqual([]);
  });
});
