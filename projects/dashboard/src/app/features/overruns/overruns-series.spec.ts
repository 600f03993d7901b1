import { overrunAnswer, smallGroup, stageGroups } from '../../testing/overrun-answers';
import { groupingFrom, overrunsView } from './overruns-series';
import type { OverrunWords } from './overrun-words';

const words: OverrunWords = { branchName: (c) => c, regionName: (c) => c, packageName: (c) => c };
const view = (more: Parameters<typeof overrunAnswer>[2] = {}) =>
  overrunsView(overrunAnswer('stage', stageGroups(), more), words);

describe('overrunsView', () => {
  it('one branch: no grouping by branch or region is offered', () => {
    expect(view().groupings).toEqual(['ageBand', 'rotFound', 'package', 'bodyType', 'month']);
  });

  it('several regions: both are', () => {
    const { groupings } = view({ scope: { regions: ['IN', 'OC'], branches: ['BRE', 'HAV'] } });
    expect(groupings).toContain('branch');
    expect(groupings).toContain('region');
  });

  it('cars without an estimate: counted apart, in words', () => {
    expect(view().apart).toBeNull();
    expect(view({ withoutEstimate: 1 }).apart).toBe(
      '1 more car had no estimate and is counted apart.',
    );
    expect(view({ withoutEstimate: 14 }).apart).toBe(
      '14 more cars had no estimate and are counted apart.',
    );
  });

  it('too few cars: no picture', () => {
    const { key: _, ...overall } = smallGroup('all');
    expect(view({ overall }).stages).toBeNull();
    expect(view().stages).not.toBeNull();
  });
});

describe('groupingFrom', () => {
  it('a grouping that is offered: itself; else age', () => {
    expect(groupingFrom('month', ['ageBand', 'month'])).toBe('month');
    expect(groupingFrom('region', ['ageBand', 'month'])).toBe('ageBand');
    expect(groupingFrom(undefined, ['ageBand'])).toBe('ageBand');
  });
});
