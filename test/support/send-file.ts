import type { Answer, TestApp } from './app';
import { readAnswer } from './read-answer';

/** A file of a branch as a form sends it. */
export interface SentFile {
  branch?: string;
  kind?: 'jobs' | 'claims';
  name?: string;
  content: string | Uint8Array;
}

/** Sends a file as a form with its one part, `file`, and waits for its check however busy the machine is. */
export async function sendFile(app: TestApp, token: string, file: SentFile): Promise<Answer> {
  const sent = await postFile(app, token, file);
  const { id, state } = (sent.body ?? {}) as { id?: string; state?: string };
  if (state !== 'checking' || id === undefined) return sent;
  const checked = await endOf(app, token, id, file.branch);
  return { ...checked, status: sent.status };
}

/** Sends a file as a form with its one part, `file`. */
async function postFile(
  app: TestApp,
  token: string,
  { branch = 'AAA', kind = 'jobs', name = 'file.csv', content }: SentFile,
): Promise<Answer> {
  const form = new FormData();
  form.set('file', new Blob([content as BlobPart], { type: 'text/csv' }), name);
  const response = await fetch(`${app.url}/api/branches/${branch}/${kind}/file`, {
    method: 'POST',
    headers: { authorization: `Bearer ${token}` },
    body: form,
  });
  return readAnswer(response);
}

/** Confirms a file and waits until it has ended; what it has become. */
export async function confirmFile(
  app: TestApp,
  token: string,
  id: string,
  branch = 'AAA',
): Promise<Answer> {
  const begun = await app.call('post', `/api/branches/${branch}/imports/${id}/confirm`, { token });
  if (begun.status !== 202) return begun;
  return endOf(app, token, id, branch);
}

/** Asks for a file until nothing works on it any more. */
export async function endOf(
  app: TestApp,
  token: string,
  id: string,
  branch = 'AAA',
): Promise<Answer> {
  for (;;) {
    const answer = await app.call('get', `/api/branches/${branch}/imports/${id}`, { token });
    const state = (answer.body as { state?: string }).state;
    if (state !== 'writing' && state !== 'checking') return answer;
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}
