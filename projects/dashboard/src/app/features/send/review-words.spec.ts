import { formatDate } from '../../ui/format';
import type { DraftDocument } from './draft-document';
import { carWords, reviewWords, type ReviewNames } from './review-words';

const NOW = Date.parse('2026-02-02T10:00:00Z');
const names: ReviewNames = {
  packageName: () => 'Full treatment',
  productName: (code) => code,
  currency: 'EUR',
  money: 'shown',
  now: NOW,
  photos: 2,
};
const document: DraftDocument = {
  jobRef: '0417',
  vehicle: { make: 'Velder', model: 'Tessock', bodyType: 'hatchback', firstRegistered: '2009-05' },
  package: 'full',
  completedOn: '2026-02-02',
  estimate: { priceCents: 78_000, stages: { strip: 90 } },
  actual: { stages: { strip: 105 } },
  agreedExtras: [{ on: '2026-02-01', minutes: 60, priceCents: 9_000, note: 'left sill' }],
  findings: [
    {
      ref: 'sill_inner/left/1',
      zone: 'sill_inner',
      side: 'left',
      seenAs: 'bubbling',
      workedAs: 'holed',
      structural: true,
      action: 'patched',
      repairMinutes: 120,
      chargedCents: 9_000,
    },
  ],
  invoice: { totalCents: 87_000, issuedOn: '2026-02-02' },
};
const textOf = (more: Partial<ReviewNames> = {}, of = document): string =>
  reviewWords(of, { ...names, ...more })
    .flatMap(({ lines }) => lines)
    .join('\n')
    .replace(/\u202f/g, ' ');

describe('reviewWords', () => {
  it('of a whole job, given a manager, says everything in words', () => {
    const text = textOf();
    for (const words of [
      'Job 0417',
      'Velder Tessock, hatchback, first registered May 2009',
      'quoted €780.00, estimated 1 h 30 min',
      'strip 1 h 45 min',
      `agreed beyond the quote on ${formatDate('2026-02-01')}: 1 h, €90.00, left sill`,
      'Finding 1, sill, inner, left, seen as bubbling, worked as holed, patched, load-bearing, repair 2 h, charged €90.00',
      '2 photos',
      `bill €870.00 before tax, of ${formatDate('2026-02-02')}`,
    ]) {
      expect(text).toContain(words);
    }
  });

  it('of the same job, given a recorder, says no money but the price quoted', () => {
    const text = textOf({ money: 'hidden' });
    expect(text.match(/€[\d.]+/g)).toEqual(['€780.00']);
    expect(text).toContain('the bill is written in the office');
  });

  it('of a running timer, given it is sent so, says that it stops then', () => {
    const startedAt = new Date(NOW - 30 * 60_000).toISOString();
    const text = textOf({}, { timers: { dry: { startedAt } } });
    expect(text).toContain('dry 30 min');
    expect(text).toContain('timer running: dry; it stops when the job is sent');
  });

  it('of a clean car, given no findings, says that none were found', () => {
    expect(textOf({ photos: 0 }, {})).toContain('no rust found');
  });
});

describe('carWords', () => {
  it('of a car, given what there is of it, names it as in the header', () => {
    expect(carWords(document)).toBe('Velder Tessock 2009');
    expect(carWords({ vehicle: { make: 'Velder' } })).toBe('Velder');
    expect(carWords({})).toBe('');
  });
});
