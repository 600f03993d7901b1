import type { Answer } from './app';

/** What a call answered, JSON read. */
export async function readAnswer(response: Response): Promise<Answer> {
  const type = response.headers.get('content-type') ?? '';
  const text = type.startsWith('text/event-stream')
    ? await firstOf(response)
    : await response.text();
  const json = type.includes('json');
  return {
    status: response.status,
    headers: response.headers,
    text,
    body: json && text !== '' ? (JSON.parse(text) as unknown) : undefined,
  };
}

/** What a stream that never ends begins with; the connection is let go. */
async function firstOf(response: Response): Promise<string> {
  if (!response.body) return '';
  const reader = response.body.getReader();
  const { value } = await reader.read();
  await reader.cancel();
  return Buffer.from(value ?? []).toString();
}
