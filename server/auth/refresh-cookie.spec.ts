import { createSecretKey } from 'node:crypto';
import { RefreshCookies } from './refresh-cookie';

const cookies = new RefreshCookies(createSecretKey(Buffer.alloc(32, 1)), {
  publicUrl: 'http://localhost:4310',
});
const stamp = { id: 7, startedAt: '2026-02-02T06:30:00.000Z', step: 3 };
const value = cookies.issue(stamp).split(';')[0]!;

describe('RefreshCookies', () => {
  it('given what it issued, reads and believes it', () => {
    const shown = cookies.read(`theme=dark; ${value}; last=1`);
    expect(shown).toMatchObject({ signInId: 7, step: 3 });
    expect(cookies.verifies(shown!, stamp)).toBe(true);
  });

  it('given the same for another sign-in, step or key, does not believe it', () => {
    const shown = cookies.read(value)!;
    expect(cookies.verifies(shown, { ...stamp, id: 8 })).toBe(false);
    expect(cookies.verifies({ ...shown, signInId: 8 }, { ...stamp, id: 8 })).toBe(false);
    expect(cookies.verifies({ ...shown, step: 4 }, stamp)).toBe(false);
    expect(cookies.verifies(shown, { ...stamp, startedAt: '2026-02-02T06:30:00.001Z' })).toBe(
      false,
    );
    const other = new RefreshCookies(createSecretKey(Buffer.alloc(32, 2)), {
      publicUrl: 'http://a',
    });
    expect(other.verifies(shown, stamp)).toBe(false);
  });

  it.each([
    undefined,
    '',
    'underseam_refresh=',
    'underseam_refresh=7.3',
    `x${value}`,
    `${value}0`,
    value.replace('7.3', '7.3.3'),
    value.replace('7.3', '-7.3'),
    value.replace('7.3', '7.3e1'),
    value.replace('=', '%3D'),
  ])('given %j, reads nothing', (header) => expect(cookies.read(header)).toBeUndefined());

  it('when cleared, leaves by the path and attributes it came with', () => {
    const attributes = (cookie: string) => cookie.split('; ').slice(2);
    expect(attributes(cookies.clear())).toEqual(attributes(cookies.issue(stamp)));
  });
});
