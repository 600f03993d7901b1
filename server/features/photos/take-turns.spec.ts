import { Turns } from './take-turns';

describe('Turns', () => {
  it('given more work than may run at once, runs the rest in order as places come free', async () => {
    const turns = new Turns(2);
    const begun: number[] = [];
    const ends: (() => void)[] = [];
    const all = [0, 1, 2, 3].map((n) =>
      turns.take(() => {
        begun.push(n);
        return new Promise<number>((resolve) => ends.push(() => resolve(n)));
      }),
    );
    const settled = (): Promise<void> => new Promise((resolve) => setImmediate(resolve));
    await settled();
    expect(begun).toEqual([0, 1]);
    ends[1]?.();
    await settled();
    expect(begun).toEqual([0, 1, 2]);
    ends[0]?.();
    await settled();
    ends[2]?.();
    ends[3]?.();
    expect(await Promise.all(all)).toEqual([0, 1, 2, 3]);
  });

  it('given work that fails, gives its place to the next all the same', async () => {
    const turns = new Turns(1);
    const failing = turns.take(() => Promise.reject(new Error('spoilt')));
    const next = turns.take(async () => 'done');
    await expect(failing).rejects.toThrow('spoilt');
    expect(await next).toBe('done');
  });
});
