import express, { type Request, type Response } from 'express';
import multer, { MulterError } from 'multer';
import { randomUUID } from 'node:crypto';
import { mkdirSync } from 'node:fs';
import { rm } from 'node:fs/promises';
import type { Upload } from '#shared/contracts/endpoint';
import { LARGEST_FILE } from '#shared/contracts/imports';
import { LARGEST_PHOTO } from '#shared/contracts/photos';
import { refuseInput } from '#shared/domain/refusal';
import { HttpProblem } from './problem';

/** The bytes of an image as sent; what they are is for the receiver to find out. */
export interface ReceivedImage {
  bytes: Buffer;
}

/** A file received into the folder for incoming ones; whoever takes it moves or removes it. */
export interface ReceivedFile {
  path: string;
  name: string;
  bytes: number;
}

const IMAGE_TYPES = ['image/jpeg', 'image/png'];
const IMAGE = express.raw({ type: IMAGE_TYPES, limit: LARGEST_PHOTO, inflate: false });

/** Reads an upload: 415 for another type, 413 when too large, 400 when it breaks off, 422 when the form has no `file`. */
export async function readUpload(
  kind: Upload,
  request: Request,
  response: Response,
  incoming: string,
): Promise<ReceivedImage | ReceivedFile> {
  return kind === 'image' ? readImage(request, response) : readFile(request, response, incoming);
}

/** Removes a received file that nobody took. */
export async function dropReceived(received: unknown): Promise<void> {
  if (typeof received === 'object' && received !== null && 'path' in received) {
    await rm(String(received.path), { force: true });
  }
}

async function readImage(request: Request, response: Response): Promise<ReceivedImage> {
  if (!request.is(IMAGE_TYPES)) {
    throw new HttpProblem(415, 'Not a photo', 'Send the photo as image/jpeg or image/png.');
  }
  await passed((done) => IMAGE(request, response, done)).catch((error: unknown) => {
    throw uploadProblem(error, 'A photo has at most 10 MB.');
  });
  const bytes: unknown = request.body;
  if (!Buffer.isBuffer(bytes) || bytes.length === 0) {
    throw new HttpProblem(400, 'No photo', 'The body holds no photo.');
  }
  return { bytes };
}

async function readFile(
  request: Request,
  response: Response,
  incoming: string,
): Promise<ReceivedFile> {
  if (!request.is('multipart/form-data')) {
    throw new HttpProblem(415, 'Not a form', 'Send the file as multipart/form-data.');
  }
  mkdirSync(incoming, { recursive: true });
  const receive = multer({
    storage: multer.diskStorage({
      destination: incoming,
      filename: (_request, _file, give) => give(null, randomUUID()),
    }),
    // A name beyond ASCII comes as the UTF-8 that browsers send.
    defParamCharset: 'utf8',
    limits: { fileSize: LARGEST_FILE, files: 1, fields: 0, parts: 2 },
  }).single('file');
  await passed((done) => receive(request, response, done)).catch((error: unknown) => {
    throw uploadProblem(error, 'A file has at most 50 MB.');
  });
  const file = request.file;
  if (!file) throw refuseInput([{ path: '/file', message: 'is required: the file to import' }]);
  return { path: file.path, name: file.originalname, bytes: file.size };
}

function passed(read: (done: (error?: unknown) => void) => void): Promise<void> {
  return new Promise((resolve, reject) => {
    read((error) => (error === undefined || error === null ? resolve() : reject(error)));
  });
}

function uploadProblem(error: unknown, tooLarge: string): unknown {
  if (error instanceof MulterError) {
    if (error.code === 'LIMIT_FILE_SIZE') return new HttpProblem(413, 'Too large', tooLarge);
    return refuseInput([
      { path: '/file', message: 'the form has exactly one part, a file named `file`' },
    ]);
  }
  const status = error instanceof Error && 'status' in error ? Number(error.status) : undefined;
  if (status === 413) return new HttpProblem(413, 'Too large', tooLarge);
  if (status === 415) {
    return new HttpProblem(415, 'Not readable', 'Send the bytes as they are, without an encoding.');
  }
  // What the reader of forms says of a body that is none, and a connection that broke off.
  return new HttpProblem(400, 'Not readable', 'The upload could not be read to its end.');
}
