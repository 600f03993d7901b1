import express, { type Request, type Response } from 'express';
import { HttpProblem } from './problem';

const READING = { strict: false, type: 'application/json', verify: refuseEmpty };
const SINGLE = express.json({ ...READING, limit: '2mb' });
const BATCH = express.json({ ...READING, limit: '32mb' });

/** Reads a JSON body: 415 for another type, 413 when too large, 400 when it is not JSON. */
export async function readBody(
  request: Request,
  response: Response,
  size: 'single' | 'batch',
): Promise<unknown> {
  if (!request.is('application/json')) {
    const empty = request.headers['content-length'] === '0' || !hasBody(request);
    throw empty ? noBody() : new HttpProblem(415, 'Not JSON', 'Send the body as application/json.');
  }
  await new Promise<void>((resolve, reject) => {
    (size === 'batch' ? BATCH : SINGLE)(request, response, (error?: unknown) => {
      if (error === undefined) resolve();
      else reject(bodyProblem(error));
    });
  });
  return request.body as unknown;
}

function hasBody(request: Request): boolean {
  return 'content-length' in request.headers || 'transfer-encoding' in request.headers;
}

function noBody(): HttpProblem {
  return new HttpProblem(400, 'No body', 'This call needs a JSON body.');
}

/** The reader takes no text at all for an empty object; it is no JSON. */
function refuseEmpty(_request: unknown, _response: unknown, body: Buffer): void {
  if (body.length === 0) throw noBody();
}

function bodyProblem(error: unknown): unknown {
  if (error instanceof HttpProblem) return error;
  const type = error instanceof Error && 'type' in error ? error.type : undefined;
  const status = error instanceof Error && 'status' in error ? Number(error.status) : 500;
  if (type === 'entity.too.large') {
    return new HttpProblem(413, 'Too large', 'The body is too large; send it in smaller pieces.');
  }
  if (type === 'entity.parse.failed') {
    return new HttpProblem(400, 'Not JSON', 'The body is not valid JSON.');
  }
  if (status === 415) {
    return new HttpProblem(415, 'Not readable', 'Send the body as UTF-8 JSON.');
  }
  if (status >= 400 && status < 500) {
    return new HttpProblem(400, 'Not readable', 'The body could not be read to its end.');
  }
  return error;
}
