import { Store } from '#db/store';
import { sql } from '#db/database';
import { PasswordThread } from '#server/workers/password-thread';

const EMAIL = 'office@bench.example';
const PASSWORD = 'a password for the bench';

/** Puts someone of head office into a data folder that is to be asked through the API. */
export async function addOffice(data: string): Promise<void> {
  const passwords = new PasswordThread(4);
  const hash = await passwords.hash(PASSWORD);
  await passwords.close();
  const store = await Store.open(data);
  await store.queue.write(() =>
    store.unscoped.run(
      sql('people').insert({
        email: EMAIL,
        email_key: EMAIL,
        name: 'Bench',
        role: 'head_office',
        password_hash: hash,
        created_at: '2026-01-01T00:00:00.000Z',
      }),
    ),
  );
  store.close();
}

/** Signs them in; returns the token. */
export async function signInOffice(url: string): Promise<string> {
  const answer = await fetch(`${url}/api/auth/sign-in`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify({ email: EMAIL, password: PASSWORD }),
  });
  return ((await answer.json()) as { accessToken: string }).accessToken;
}

/** Asks one address and reads the whole answer. */
export async function get(url: string, token: string): Promise<string> {
  const answer = await fetch(url, { headers: { authorization: `Bearer ${token}` } });
  const text = await answer.text();
  if (!answer.ok) throw new Error(`${answer.status}: ${text.slice(0, 300)}`);
  return text;
}

/** Milliseconds that some work takes. */
export async function timed(work: () => unknown): Promise<number> {
  const begun = performance.now();
  await work();
  return performance.now() - begun;
}
