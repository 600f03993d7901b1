import type { JobSheet } from '#shared/contracts/jobs';
import { cautionsOf } from './cautions';

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
      'Load-bearing repair',
    ]);
  });

  it('of a rotten jacking point warns of lifting there', () => {
    expect(
      dangers(job([finding({ zone: 'jacking_point', action: 'treated', workedAs: 'bubbling' })])),
    ).toEqual(['Lifting']);
  });
});
