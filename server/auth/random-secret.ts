import { randomBytes } from 'node:crypto';

/** 256 random bits as 64 hexadecimal digits: a one-time token or the secret of a push key. */
export function randomSecret(): string {
  return randomBytes(32).toString('hex');
}

/** The public part of a push key: 12 hexadecimal digits, unique but not secret. */
export function randomKeyId(): string {
  return randomBytes(6).toString('hex');
}
