import type { Answer } from './app';

/** What a call answered, JSON read. */
export async function readAnswer(response: Response): Promise<Answer> {
  const text = await response.text();
  const json = response.headers.get('content-type')?.includes('json') === true;
  return {
    status: response.status,
    headers: response.headers,
    text,
    body: json && text !== '' ? (JSON.parse(text) as unknown) : undefined,
  };
}
