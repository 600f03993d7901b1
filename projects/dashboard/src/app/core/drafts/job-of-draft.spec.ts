import type { JobDraft } from '#shared/contracts/under-way';
import { jobOfDraft } from './job-of-draft';
import { minutesRunning } from './timers';

const NOW = new Date('2026-02-02T10:30:00Z');

/** Everything that a job needs, and nothing more. */
const WHOLE: JobDraft = {
  vehicle: {
    make: 'Velder',
    model: 'Tessock',
    bodyType: 'hatchback',
    firstRegistered: '2009-05',
  },
  package: 'full',
  completedOn: '2026-02-02',
  actual: { stages: { strip: 60 } },
};
const made = (draft: JobDraft) => {
  const result = jobOfDraft(draft, NOW);
  if ('missing' in result) throw new Error(JSON.stringify(result.missing));
  return result.job;
};
const missing = (draft: JobDraft) => {
  const result = jobOfDraft(draft, NOW);
  return 'missing' in result ? result.missing.map(({ path }) => path) : [];
};

describe('jobOfDraft', () => {
  it('of an empty draft, names everything a job cannot do without', () => {
    expect(missing({})).toEqual([
      '/vehicle/make',
      '/vehicle/model',
      '/vehicle/bodyType',
      '/vehicle/firstRegistered',
      '/package',
      '/completedOn',
    ]);
  });

  it('of a whole draft, is that job', () => {
    expect(made(WHOLE)).toEqual(WHOLE);
  });

  it('given a timer running, adds its minutes up to now and sends no timer', () => {
    const draft: JobDraft = {
      ...WHOLE,
      timers: {
        strip: { startedAt: '2026-02-02T10:00:00Z' },
        apply: { startedAt: '2026-02-02T09:15:29Z' },
      },
    };
    expect(made(draft).actual.stages).toEqual({ strip: 90, apply: 75 });
    expect(made(draft)).not.toHaveProperty('timers');
  });

  it('given groups opened and left empty, leaves them out', () => {
    const draft: JobDraft = {
      ...WHOLE,
      estimate: { stages: {} },
      products: [],
      findings: [],
      checks: {},
      workshop: {},
      invoice: {},
      notes: '  ',
    };
    expect(made(draft)).toEqual(WHOLE);
  });

  it('given estimated minutes without a price, asks for the price', () => {
    expect(missing({ ...WHOLE, estimate: { stages: { strip: 40 } } })).toEqual([
      '/estimate/priceCents',
    ]);
  });

  it('given a product without an amount, asks for it in its row', () => {
    const products = [{ product: 'CW1', ml: 3800 }, { product: 'UW1' }];
    expect(missing({ ...WHOLE, products })).toEqual(['/products/1/ml']);
  });

  it('given a finding patched that does not say as what it was worked, asks for that', () => {
    const draft: JobDraft = {
      ...WHOLE,
      findings: [
        {
          ref: 'a',
          zone: 'sill_inner',
          side: 'left',
          seenAs: 'bubbling',
          structural: true,
          action: 'patched',
        },
      ],
    };
    expect(missing(draft)).toEqual(['/findings/0/workedAs']);
  });

  it('leaves the draft itself as it was', () => {
    const draft: JobDraft = { ...WHOLE, timers: { strip: { startedAt: '2026-02-02T10:00:00Z' } } };
    const before = JSON.stringify(draft);
    jobOfDraft(draft, NOW);
    expect(JSON.stringify(draft)).toBe(before);
  });
});

describe('minutesRunning', () => {
  it.each([
    ['half a minute and a second', '2026-02-02T10:29:29Z', 1],
    ['less than half a minute', '2026-02-02T10:29:31Z', 0],
    ['a night and a day', '2026-02-01T08:30:00Z', 26 * 60],
    ['a clock set back', '2026-02-02T11:00:00Z', 0],
  ])('given %s, counts whole minutes to the nearest', (_what, startedAt, minutes) => {
    expect(minutesRunning(startedAt, NOW)).toBe(minutes);
  });
});
