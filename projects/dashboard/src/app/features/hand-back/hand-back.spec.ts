import type { JobSheet } from '#shared/contracts/jobs';
import { handedCautions } from './hand-back-cautions';
import { checkFacts, productFacts, warrantyWords } from './hand-back-facts';
import { handedFindings } from './hand-back-findings';

type Finding = NonNullable<JobSheet['findings']>[number];
const finding = (ref: string, more: Partial<Finding> = {}): Finding => ({
  ref,
  zone: 'sill_inner',
  side: 'left',
  seenAs: 'bubbling',
  structural: false,
  action: 'treated',
  ...more,
});
const dangerous = finding('d', { structural: true, action: 'declined' });
const dangersOf = (...findings: Finding[]) => handedCautions(findings).map(({ danger }) => danger);

describe('handedFindings', () => {
  it('findings of all kinds: what was left comes first, the dangerous of it before the rest, numbered through', () => {
    const { ordered, left, done } = handedFindings([
      finding('a', { workedAs: 'holed', action: 'patched' }),
      finding('b', { action: 'deferred' }),
      dangerous,
    ]);
    expect(ordered.map(({ ref }) => ref)).toEqual(['d', 'b', 'a']);
    expect(left.map(({ number, dangerous: danger }) => [number, danger])).toEqual([
      [1, true],
      [2, false],
    ]);
    expect(done).toEqual([
      {
        number: 3,
        place: 'sill, inner, left',
        words: 'rust lifting the paint or coat, holed once opened; metal replaced',
        dangerous: false,
      },
    ]);
  });
});

describe('handedCautions', () => {
  it('nothing found: fresh wax and brakes still go home with the car', () => {
    expect(dangersOf()).toEqual(['Fresh wax burns', 'Brakes']);
  });

  it('load-bearing rot left: stands first and says that the car may not be fit for the road', () => {
    const [first] = handedCautions([dangerous]);
    expect(first?.words).toContain('may not be fit for the road');
    expect(first?.words).toContain('local inspection rules');
  });

  it('a rusted jacking point left: names the side not to lift at', () => {
    const point = { ...dangerous, zone: 'jacking_point', side: 'right' } as const;
    expect(dangersOf(point)).toContain('Lifting');
    expect(handedCautions([point])[1]?.words).toContain('right');
    expect(dangersOf({ ...point, workedAs: 'holed', action: 'patched' })).not.toContain('Lifting');
  });
});

describe('facts of the hand-back sheet', () => {
  const job = (more: object): JobSheet =>
    ({ completedOn: '2026-01-28', warrantyMonths: 36, ...more }) as unknown as JobSheet;

  it('product in several lines: one line each, in plain words, unused ones left out', () => {
    const catalogue = [{ code: 'CW1', name: 'Cavity wax, thin', kind: 'cavity_wax' as const }];
    const products = [
      { product: 'CW1', ml: 2000 },
      { product: 'CW1', ml: 2200 },
      { product: 'UW1', ml: 0 },
    ];
    expect(productFacts(job({ products }), catalogue)).toEqual([
      { name: 'Cavity wax, thin: thin wax inside the closed hollows', text: '4.2\u202fL' },
    ]);
  });

  it('checks: a no is said as not done, a silence as not recorded', () => {
    const texts = checkFacts(job({ checks: { linersOff: 'yes', driedOut: 'no' } }));
    expect(texts.map(({ text }) => text)).toEqual([
      'done',
      'not recorded',
      'not recorded',
      'not done',
      'not recorded',
      'not recorded',
    ]);
  });

  it('warranty: months and their last day; none where none was sold', () => {
    expect(warrantyWords(job({}))).toMatch(/^36 months, to /);
    expect(warrantyWords(job({ warrantyMonths: 0 }))).toBe('none');
  });
});
