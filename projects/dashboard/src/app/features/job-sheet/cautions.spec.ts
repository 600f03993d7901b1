import type { JobSheet } from '#shared/contracts/jobs';
import { cautionsOf, isLeftDangerous } from './cautions';

type Finding = NonNullable<JobSheet['findings']>[number];
const finding = (change: Partial<Finding>): Finding => ({
  ref: 'a',
  zone: 'sill_inner',
  side: 'left',
  seenAs: 'bubbling',
  structural: true,
  action: 'deferred',
  ...change,
});
const job = (findings: Finding[], repair = 0): JobSheet =>
  ({ actual: { stages: { repair } }, findings }) as unknown as JobSheet;
const dangers = (sheet: JobSheet) => cautionsOf(sheet).map((caution) => caution.danger);

describe('isLeftDangerous', () => {
  it('of structural rot deferred or declined is true', () => {
    expect(isLeftDangerous(finding({}))).toBe(true);
    expect(
      isLeftDangerous(finding({ action: 'declined', seenAs: 'surface', workedAs: 'holed' })),
    ).toBe(true);
  });

  it('of surface rust, of rot that bears no load, and of rot patched is false', () => {
    expect(isLeftDangerous(finding({ seenAs: 'surface' }))).toBe(false);
    expect(isLeftDangerous(finding({ structural: false }))).toBe(false);
    expect(isLeftDangerous(finding({ action: 'patched', workedAs: 'holed' }))).toBe(false);
  });
});

describe('cautionsOf', () => {
  it('of a sound car has none', () => {
    expect(dangers(job([]))).toEqual([]);
  });

  it('of structural rot left and welding done names both, what was left first', () => {
    expect(dangers(job([finding({})], 120))).toEqual(['Left on the car', 'Fire']);
  });

  it('of a structural patch asks for a competent person', () => {
    expect(dangers(job([finding({ action: 'patched', workedAs: 'holed' })]))).toEqual([
      'Fire',
      'Structural repair',
    ]);
  });

  it('of a rotten jacking point warns of lifting there', () => {
    expect(
      dangers(job([finding({ zone: 'jacking_point', action: 'treated', workedAs: 'bubbling' })])),
    ).toEqual(['Lifting']);
  });
});
