import type { Answer } from './app';

/** The refresh cookie that an answer sets, as a browser would send it back. */
export function refreshCookie(answer: Answer): string {
  const [cookie = ''] = answer.headers.getSetCookie();
  return cookie.split(';')[0] ?? '';
}
