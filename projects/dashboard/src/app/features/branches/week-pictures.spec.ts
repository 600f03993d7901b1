import { branchWeeks, branchWeeksAnswer } from '../../testing/branches-answers';
import { weekPictures } from './week-pictures';

const WORDS = { branchName: (code: string) => code, productName: (code: string) => code };

describe('weekPictures', () => {
  it('two branches: by name, on one scale that holds values, usual range and target', () => {
    const low = branchWeeks('AAA', { target: 0.9 });
    const { pictures } = weekPictures(branchWeeksAnswer([branchWeeks('HAV'), low]), WORDS);
    expect(pictures.map(({ name }) => name)).toEqual(['AAA', 'HAV']);
    expect(pictures.map(({ chart }) => chart.scale)).toEqual([
      [0.9, 1.5],
      [0.9, 1.5],
    ]);
  });

  it('a marked week: is told of in the picture’s and in the sheet’s words; the target apart from the range', () => {
    const { pictures, finding, note } = weekPictures(
      branchWeeksAnswer([branchWeeks('HAV')]),
      WORDS,
    );
    expect(pictures[0]!.last).toContain('in week 5');
    expect(pictures[0]!.chart.summary).toContain('1 week outside');
    expect(finding).toContain('HAV 1 week outside');
    expect(note).toContain('no limit');
  });

  it('claims: bars of counts, no target', () => {
    const weeks = [
      { week: '2026-W04', cars: 90, value: 2, signal: null },
      { week: '2026-W05', cars: 90, value: 0, signal: null },
    ];
    const { pictures } = weekPictures(
      branchWeeksAnswer([branchWeeks('HAV', { weeks, limits: null, target: 9 })], {
        measure: 'claims',
      }),
      WORDS,
    );
    expect(pictures[0]).toMatchObject({
      last: '2 claims',
      chart: {
        look: 'bars',
        target: null,
        scale: [0, 2],
        summary: 'HAV: 2 claims in 2 weeks, at most 2 in one',
      },
    });
  });
});
