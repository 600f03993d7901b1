import type { ErrorRequestHandler, RequestHandler, Response } from 'express';
import type { Logger } from 'pino';
import { problemOf, type ProblemReply } from './problem';

/** The one place where an error becomes an answer. What is not a known refusal is logged and told as a fault of ours, without its message. */
export function handleErrors(log: Logger): ErrorRequestHandler {
  return (error: unknown, request, response, _next) => {
    const known = problemOf(error);
    if (!known) {
      // A driver's message may echo values of a row: its name and code only.
      log.error({ fault: faultOf(error), path: request.path }, 'request failed');
      log.debug({ err: error }, 'request failed');
    }
    if (response.headersSent) {
      // A stream that fails half-way must not end as if it were complete.
      response.destroy();
      return;
    }
    sendProblem(
      response,
      known ?? {
        document: {
          type: 'about:blank',
          title: 'Something broke here',
          status: 500,
          detail: 'The request could not be completed. Nothing half-done was kept; try again.',
        },
        headers: {},
      },
    );
  };
}

/** Whatever under /api is not mounted does not exist. */
export const nothingHere: RequestHandler = (_request, response) => {
  sendProblem(response, {
    document: {
      type: 'about:blank',
      title: 'Not found',
      status: 404,
      detail: 'There is nothing under this address.',
    },
    headers: {},
  });
};

function sendProblem(response: Response, { document, headers }: ProblemReply): void {
  response
    .status(document.status)
    .set(headers)
    .set('Cache-Control', 'no-store')
    .type('application/problem+json')
    .send(JSON.stringify(document));
}

function faultOf(error: unknown): {
  name: string;
  code: string | undefined;
  at: string | undefined;
} {
  if (!(error instanceof Error)) return { name: typeof error, code: undefined, at: undefined };
  const at = error.stack
    ?.split('\n')
    .find((line) => line.trim().startsWith('at '))
    ?.trim();
  return { name: error.name, code: 'code' in error ? String(error.code) : undefined, at };
}
