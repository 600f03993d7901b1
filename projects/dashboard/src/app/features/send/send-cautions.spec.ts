import { findingCautions, handOverCautions, productCautions, stageCautions } from './send-cautions';
import type { DraftFinding } from './findings-edit';

const finding = (more: Partial<DraftFinding> = {}): DraftFinding => ({
  ref: 'x',
  zone: 'sill_inner',
  side: 'left',
  seenAs: 'bubbling',
  structural: true,
  ...more,
});
const dangers = (cautions: readonly { danger: string }[]): string[] =>
  cautions.map(({ danger }) => danger);

describe('cautions of the form', () => {
  it('beside a finding, given it is patched, warn of fire and of load-bearing repair', () => {
    expect(dangers(findingCautions(finding({ action: 'patched' })))).toEqual([
      'Fire',
      'Load-bearing repair',
    ]);
    const panel = finding({ action: 'patched', structural: false });
    expect(dangers(findingCautions(panel))).toEqual(['Fire']);
  });

  it('beside a finding, given load-bearing rot that is left, have the owner told in writing', () => {
    for (const action of ['deferred', 'declined'] as const) {
      const [left] = findingCautions(finding({ action }));
      expect(left?.words).toContain('tell the owner in writing');
      expect(dangers(handOverCautions({ findings: [finding({ action })] }))).toEqual([
        'Left on the car',
        'Brakes',
      ]);
    }
    expect(findingCautions(finding({ action: 'deferred', seenAs: 'surface' }))).toEqual([]);
  });

  it('beside the stages, given a rotten jacking point, forbid to lift there', () => {
    const point = finding({ zone: 'jacking_point', seenAs: 'holed' });
    const { strip } = stageCautions({ findings: [point] });
    expect(strip?.words).toContain('Never support the car on it');
    expect(stageCautions({}).strip?.words).toContain('rated, sound points');
  });

  it('beside the stages, given repair, warn of fire from the first minute', () => {
    expect(stageCautions({}).repair).toBeUndefined();
    expect(stageCautions({ actual: { stages: { repair: 5 } } }).repair?.danger).toBe('Fire');
    const startedAt = '2026-02-02T10:00:00.000Z';
    expect(stageCautions({ timers: { repair: { startedAt } } }).repair?.danger).toBe('Fire');
  });

  it('beside product, given any car, speak of mist and brakes', () => {
    expect(dangers(productCautions())).toEqual(['Solvent mist', 'Brakes']);
  });
});
