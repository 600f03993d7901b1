import sharp, { type Sharp } from 'sharp';
import type { Answer, TestApp } from './app';
import { readAnswer } from './read-answer';

/** A picture of one colour; a white square in its upper left corner shows which way is up. */
export function picture(width = 64, height = 48, colour = '#205080'): Sharp {
  const square = { create: { width: 8, height: 8, channels: 3, background: '#ffffff' } } as const;
  return sharp({ create: { width, height, channels: 3, background: colour } }).composite([
    { input: square, left: 0, top: 0 },
  ]);
}

/** The same as a JPEG. */
export function jpegOf(width?: number, height?: number, colour?: string): Promise<Buffer> {
  return picture(width, height, colour).jpeg().toBuffer();
}

/** Sends the bytes of a photo. */
export async function sendPhoto(
  app: TestApp,
  address: string,
  bytes: Uint8Array<ArrayBuffer> | Buffer,
  { token, type = 'image/jpeg' }: { token: string | undefined; type?: string },
): Promise<Answer> {
  const response = await fetch(app.url + address, {
    method: 'PUT',
    headers: {
      'content-type': type,
      ...(token !== undefined && { authorization: `Bearer ${token}` }),
    },
    body: new Uint8Array(bytes),
  });
  return readAnswer(response);
}

/** The bytes that a call answers. */
export async function bytesOf(
  app: TestApp,
  address: string,
  token: string,
): Promise<{ status: number; type: string | null; bytes: Buffer }> {
  const response = await fetch(app.url + address, {
    headers: { authorization: `Bearer ${token}` },
  });
  const bytes = Buffer.from(await response.arrayBuffer());
  return { status: response.status, type: response.headers.get('content-type'), bytes };
}
