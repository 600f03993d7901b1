import { bearerToken } from './bearer-token';

const read = (authorization?: string) => bearerToken({ headers: { authorization } });

describe('bearerToken', () => {
  it.each([
    ['Bearer abc.def', 'abc.def'],
    ['bearer   abc', 'abc'],
    ['BEARER usk_1_2', 'usk_1_2'],
  ])('given %j, reads %j', (header, token) => expect(read(header)).toBe(token));

  it.each([
    undefined,
    '',
    'Bearer',
    'Bearer ',
    'Basic abc',
    'xBearer abc',
    'Bearer a b',
    'Bearerabc',
  ])('given %j, reads nothing', (header) => expect(read(header)).toBeNull());

  it('given a header made to be slow to read, is done at once', () => {
    const start = performance.now();
    for (let time = 0; time < 100; time += 1) {
      expect(read(`Bearer ${'a'.repeat(16_000)}`)).toBeNull();
      expect(read(`Bearer${' '.repeat(1_900)}`)).toBeNull();
    }
    expect(performance.now() - start).toBeLessThan(500);
  });
});
