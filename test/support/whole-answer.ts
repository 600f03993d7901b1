import type { Answer } from './app';

/** Everything an answer tells but the moment it was given: status, headers, body. */
export function wholeAnswer(answer: Answer): string {
  const headers: string[] = [];
  answer.headers.forEach((value, name) => {
    if (name !== 'date') headers.push(`${name}: ${value}`);
  });
  return [answer.status, ...headers, answer.text].join('\n');
}
