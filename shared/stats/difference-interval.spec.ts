import { differenceInterval } from './difference-interval';
import { wilsonInterval } from './wilson-interval';

const share = (part: number, whole: number) => {
  const { estimate, lower, upper } = wilsonInterval(part, whole)!;
  return { value: estimate, lower, upper };
};

describe('differenceInterval', () => {
  // Newcombe (1998), table II, cases (a) 56/70 − 48/80 and (c) 6/7 − 2/7, method 10; quoted from memory.
  it.each([
    [56, 70, 48, 80, 0.0524, 0.3339],
    [6, 7, 2, 7, 0.0582, 0.8062],
  ])('given %i of %i and %i of %i, is the published hybrid score interval', (...given) => {
    const [x, m, y, n, lower, upper] = given;
    const difference = differenceInterval(share(x, m), share(y, n));
    expect(difference.value).toBeCloseTo(x / m - y / n, 12);
    expect(difference.lower).toBeCloseTo(lower, 4);
    expect(difference.upper).toBeCloseTo(upper, 4);
  });

  it('given the two the other way round, turns around', () => {
    const [one, other] = [share(3, 20), share(9, 30)];
    const there = differenceInterval(one, other);
    const back = differenceInterval(other, one);
    expect([back.value, back.lower, back.upper]).toEqual([
      -there.value,
      expect.closeTo(-there.upper, 12),
      expect.closeTo(-there.lower, 12),
    ]);
  });
});
