import { createSecretKey } from 'node:crypto';
import jwt from 'jsonwebtoken';
import { issueAccessToken } from './access-token';
import { issueUnsubscribeToken, readUnsubscribeToken } from './unsubscribe-token';

const key = createSecretKey(Buffer.alloc(32, 1));
const other = createSecretKey(Buffer.alloc(32, 2));
const ASKED = { personId: 7, kind: 'monday_digest' } as const;

describe('An unsubscribe token', () => {
  it('given the key that signed it, says whose mail of which kind, the same every time', () => {
    const token = issueUnsubscribeToken(key, ASKED);
    expect(readUnsubscribeToken(key, token)).toEqual(ASKED);
    expect(issueUnsubscribeToken(key, ASKED)).toBe(token);
    expect(jwt.decode(token)).not.toHaveProperty('exp');
  });

  it('given another key, another purpose, a changed kind or nonsense, says nothing', () => {
    const token = issueUnsubscribeToken(key, ASKED);
    const [head, , mark] = token.split('.');
    const body = Buffer.from(JSON.stringify({ ...(jwt.decode(token) as object), sub: '8' }));
    const forged = [
      issueUnsubscribeToken(other, ASKED),
      issueAccessToken(key, { personId: 7, signInId: 1 }, new Date()),
      `${head}.${body.toString('base64url')}.${mark}`,
      jwt.sign({ kind: 'monday_digest' }, '', {
        algorithm: 'none',
        subject: '7',
        audience: 'underseam mail choices',
      }),
      jwt.sign({ kind: 'gossip' }, key, { subject: '7', audience: 'underseam mail choices' }),
      `${token}x`,
      '',
    ];
    for (const one of forged) expect(readUnsubscribeToken(key, one)).toBeUndefined();
  });
});
