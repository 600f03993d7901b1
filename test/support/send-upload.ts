import type { Upload } from '#shared/contracts/endpoint';
import type { Answer, TestApp } from './app';
import { readAnswer } from './read-answer';
import { jpegOf } from './send-photo';

/** Sends an upload as a call wants it: a photo, or a form with a file. */
export async function sendUpload(
  app: TestApp,
  kind: Upload,
  method: string,
  address: string,
  token: string,
): Promise<Answer> {
  const form = new FormData();
  form.set('file', new Blob(['a;b\r\n1;2\r\n'], { type: 'text/csv' }), 'file.csv');
  const response = await fetch(app.url + address, {
    method: method.toUpperCase(),
    headers: {
      authorization: `Bearer ${token}`,
      ...(kind === 'image' && { 'content-type': 'image/jpeg' }),
    },
    body: kind === 'image' ? new Uint8Array(await jpegOf()) : form,
  });
  return readAnswer(response);
}
