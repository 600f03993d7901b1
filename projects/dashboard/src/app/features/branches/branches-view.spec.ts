import { FUNNEL_FLAGS } from '#shared/domain/vocabulary';
import { branchesAnswer, branchStanding, fewCars } from '../../testing/branches-answers';
import { FLAG_WORDS } from './branch-words';
import { branchesView } from './branches-view';

const WORDS = { branchName: (code: string) => code, productName: (code: string) => code };
const view = (...given: Parameters<typeof branchesAnswer>) =>
  branchesView(branchesAnswer(...given), WORDS, {
    today: '2026-02-02',
    linkOf: (branch) => ({ commands: ['/overruns'], query: { branch } }),
  });
const said = (parts: ReturnType<typeof view>['answer']['sentence']): string =>
  parts
    .map((part) => {
      if (typeof part === 'string') return part;
      if ('figure' in part) return part.figure;
      return 'quiet' in part ? part.quiet : part.text;
    })
    .join('');
const ABOVE = { value: 1.35, flag: 'above_998' } as const;

describe('branchesView', () => {
  it('one outside: how many, who, by how much and in which direction', () => {
    const { answer } = view([branchStanding('HAV'), branchStanding('SKU', ABOVE), fewCars('TEG')]);
    expect(said(answer.sentence)).toBe(
      '1 of 2 branches stands outside the funnel on overrun (400 cars).',
    );
    expect(said(answer.second)).toBe(
      'Allowing for their cars: SKU 15 points above. 1 branch has too few cars yet.',
    );
  });

  it('nobody outside: says so, whatever their order', () => {
    const { answer } = view([branchStanding('HAV'), branchStanding('SKU')]);
    expect(said(answer.sentence)).toBe(
      'All 2 branches are as expected on overrun, whatever their order.',
    );
  });

  it('too few cars everywhere: no funnel, the count stays', () => {
    const { answer, funnel } = view([fewCars('HAV', 2), fewCars('SKU', 1)]);
    expect(said(answer.sentence)).toContain('Too few cars yet: 3');
    expect(funnel).toBeUndefined();
  });

  it('no car at all: says what to do', () => {
    const { answer, placed } = view([]);
    expect(said(answer.sentence)).toContain('No car');
    expect(placed).toBe(false);
  });

  it('one branch: stands against the reference, which is named', () => {
    const { answer } = view([branchStanding('SKU', ABOVE)], { reference: 'scope' });
    expect(said(answer.sentence)).toBe(
      'SKU stands 15 points above what its cars lead one to expect on overrun (200 cars).',
    );
    expect(said(answer.second)).toContain('among the branches shown here only');
  });

  it('each flag: is drawn outside if and only if it says so, with its words in the row', () => {
    for (const flag of FUNNEL_FLAGS) {
      const value = flag.startsWith('above') ? 1.3 : flag.startsWith('below') ? 1.1 : 1.2;
      const standing = flag === 'too_few' ? fewCars('HAV') : branchStanding('HAV', { value, flag });
      const { funnel, rows, columns } = view([standing, branchStanding('SKU')]);
      const stand = funnel?.points.find(({ key }) => key === 'HAV')?.stand;
      expect(stand).toBe(
        flag === 'too_few' ? undefined : flag === 'as_expected' ? 'inside' : flag.slice(0, 5),
      );
      const column = columns.find(({ key }) => key === 'flag')!;
      expect(column.text(rows.find(({ branch }) => branch === 'HAV')!)).toBe(FLAG_WORDS[flag]);
    }
  });

  it('rows: by name, also a branch without cars; one that is silent is told since when', () => {
    const answer = branchesAnswer([branchStanding('SKU')]);
    const { rows, columns } = view([branchStanding('SKU')], {
      received: [
        ...answer.received,
        { branch: 'HAV', region: 'SOUND', receivedThrough: '2026-01-12', lastReceivedAt: null },
        { branch: 'NEW', region: 'SOUND', receivedThrough: null, lastReceivedAt: null },
      ],
    });
    expect(rows.map(({ name }) => name)).toEqual(['HAV', 'NEW', 'SKU']);
    const received = columns.find(({ key }) => key === 'received')!;
    expect(rows.map((row) => received.text(row))).toEqual([
      expect.stringMatching(/^nothing since .*12/),
      'nothing received yet',
      expect.stringMatching(/^(30 Jan|Jan 30)/),
    ]);
    expect(columns.find(({ key }) => key === 'flag')!.text(rows[0]!)).toBe('no cars in this time');
  });

  it('a target: has a column only where one is set', () => {
    const keys = (target: number | null) =>
      view([branchStanding('HAV', { target })]).columns.map(({ key }) => key);
    expect(keys(null)).not.toContain('target');
    expect(keys(1.1)).toContain('target');
  });
});
