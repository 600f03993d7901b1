import type { Response } from 'express';

/** A download that takes nothing for so long is given up, because it holds a thread and an old state of the database. */
const PATIENCE_MS = 60_000;

/** Chunks of a CSV file, made as they are taken. */
export interface CsvChunks extends AsyncIterable<string> {
  /** Wants no more. */
  cancel(): void;
}

/**
 * Streams a CSV file as a download at the pace at which it is taken. Nothing is sent before the first chunk is there, so that
 * a failure before it is answered as any other; one after it breaks the connection, because a polite end would make a cut file
 * look whole. A reader who leaves ends the work.
 */
export async function streamCsv(
  response: Response,
  filename: string,
  chunks: CsvChunks,
  patienceMs: number = PATIENCE_MS,
): Promise<void> {
  const leave = (): void => chunks.cancel();
  response.once('close', leave);
  try {
    for await (const chunk of chunks) {
      if (!response.headersSent) {
        response
          .status(200)
          .set('Content-Type', 'text/csv; charset=utf-8; header=present')
          .set('Content-Disposition', `attachment; filename="${filename}"`);
      }
      if (!response.write(chunk)) await waitForRoom(response, patienceMs);
    }
    response.off('close', leave);
    response.end();
  } catch (error) {
    // Gone before the end: there is nobody left to tell.
    if (response.closed) return;
    if (response.headersSent) response.destroy();
    throw error;
  } finally {
    chunks.cancel();
  }
}

/** Settles when the response takes more; throws when it is closed or takes nothing for too long. */
function waitForRoom(response: Response, patienceMs: number): Promise<void> {
  return new Promise((resolve, reject) => {
    const settle = (act: () => void) => (): void => {
      clearTimeout(timer);
      response.off('drain', drained).off('close', closed);
      act();
    };
    const drained = settle(resolve);
    const closed = settle(() => reject(new Error('the reader of an export left')));
    const timer = setTimeout(
      settle(() => reject(new Error('the reader of an export took nothing for too long'))),
      patienceMs,
    );
    response.once('drain', drained).once('close', closed);
  });
}
