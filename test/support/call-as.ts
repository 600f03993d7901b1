import type { Answer, TestApp } from './app';

/** Calls of one person, and of others where their token is given. */
export interface Calls {
  call: (method: string, path: string, body?: unknown, token?: string) => Promise<Answer>;
  /** Puts, and stops the test where that is refused. */
  put: (path: string, body: unknown) => Promise<Answer>;
  /** The body of what is read. */
  get: (path: string) => Promise<Answer['body']>;
}

/** Calls of a running product as the person whose token is told when it is needed. */
export function callAs(app: () => TestApp, person: () => string): Calls {
  const call: Calls['call'] = (method, path, body, token = person()) =>
    app().call(method, path, { token, ...(body !== undefined && { body }) });
  return {
    call,
    put: async (path, body) => {
      const answer = await call('put', path, body);
      if (answer.status >= 300) throw new Error(`${path}: ${answer.text}`);
      return answer;
    },
    get: async (path) => (await call('get', path)).body,
  };
}
