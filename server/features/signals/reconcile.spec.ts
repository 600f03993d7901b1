import { SIGNAL_KINDS } from '#shared/domain/vocabulary';
import { plainSignal, type FoundSignal } from './found-signal';
import { reconcile, type KeptSignal } from './reconcile';

/** Numbers that repeat with their seed. Source: S. K. Park and K. W. Miller, Communications of the ACM 31 (1988), 1192–1201. */
function drawsOf(seed: number): () => number {
  let state = seed;
  return () => (state = (state * 48271) % 2147483647) / 2147483647;
}

function found(over: Partial<FoundSignal> = {}): FoundSignal {
  const plain = plainSignal({
    ...{ branchId: 1, kind: 'silence', key: 'silence', since: '2026-01-05' },
    ...{ strength: 1, facts: {}, cars: 0, listed: [] },
  });
  return { ...plain, ...over };
}

interface Kept extends KeptSignal {
  over: boolean;
}

/** The kept signals after a look, as the writer keeps them. */
function after(kept: Kept[], looked: FoundSignal[]): Kept[] {
  const changes = reconcile(
    kept.filter(({ over }) => !over),
    looked,
  );
  return [
    ...kept.map((signal) => ({
      ...signal,
      over: signal.over || changes.ended.includes(signal.id),
      since: changes.kept.find(({ id }) => id === signal.id)?.found.since ?? signal.since,
    })),
    ...changes.opened.map(({ branchId, kind, key, since }, index) => ({
      ...{ id: kept.length + index, branchId, kind, key, since, over: false },
    })),
  ];
}

describe('reconcile', () => {
  it('given what was found before, found now and found no more, keeps, opens and ends', () => {
    const kept = after([], [found(), found({ branchId: 2 })]);
    const changes = reconcile(kept, [found({ strength: 3 }), found({ key: 'other' })]);
    expect(changes.kept.map(({ id, found: { strength } }) => [id, strength])).toEqual([[0, 3]]);
    expect(changes.opened.map(({ key }) => key)).toEqual(['other']);
    expect(changes.ended).toEqual([1]);
  });

  it('given something that only keeps, opens nothing and ends nothing', () => {
    expect(reconcile([], [found({ weight: 'keep' })]).opened).toEqual([]);
    const kept = after([], [found()]);
    const changes = reconcile(kept, [found({ weight: 'keep' })]);
    expect([changes.kept.length, changes.ended]).toEqual([1, []]);
  });

  it('given a branch still out of the funnel, says since when it was first seen outside; of others what they say', () => {
    const funnel = { kind: 'left_funnel', key: 'rot high', since: '2026-01-05' } as const;
    const kept = after([], [found(funnel), found()]);
    const later = [found({ ...funnel, since: '2026-01-06' }), found({ since: '2026-01-06' })];
    expect(after(kept, later).map(({ since }) => since)).toEqual(['2026-01-05', '2026-01-06']);
  });

  it('given any looks one after another, never has two alike that are not over, and ends with what the last look found', () => {
    for (let seed = 1; seed <= 200; seed += 1) {
      const draw = drawsOf(seed);
      let kept: Kept[] = [];
      for (let night = 0; night < 12; night += 1) {
        const looked = Array.from({ length: Math.floor(8 * draw()) }, () =>
          found({
            branchId: 1 + Math.floor(2 * draw()),
            kind: SIGNAL_KINDS[Math.floor(3 * draw())] ?? 'silence',
            key: draw() < 0.5 ? 'a' : 'b',
          }),
        );
        kept = after(kept, looked);
        const twice = reconcile(
          kept.filter(({ over }) => !over),
          looked,
        );
        expect([twice.opened, twice.ended]).toEqual([[], []]);
        const names = kept.filter(({ over }) => !over).map(nameOf);
        expect(new Set(names).size).toBe(names.length);
        expect(new Set(names)).toEqual(new Set(looked.map(nameOf)));
      }
    }
  });
});

function nameOf({ branchId, kind, key }: Pick<KeptSignal, 'branchId' | 'kind' | 'key'>): string {
  return `${branchId} ${kind} ${key}`;
}
