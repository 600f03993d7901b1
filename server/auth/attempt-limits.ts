import { Router, type RequestHandler } from 'express';
import { rateLimit, type Options } from 'express-rate-limit';
import { Refusal } from '#shared/domain/refusal';

const WINDOW_MS = 15 * 60_000;
/** Generous, because a whole branch may sit behind one address; the lock-out per person is the narrow one. */
const ATTEMPTS = 100;

/**
 * Limits, per network address, failed attempts at a password or a one-time token, and reset mails asked for. Stands before
 * the router of the API; answers 429 like every other problem.
 */
export function attemptLimits(): RequestHandler {
  const router = Router();
  const failures = limit({ skipSuccessfulRequests: true });
  router.post('/api/auth/sign-in', failures);
  router.post('/api/auth/set-password', failures);
  router.post('/api/auth/password', failures);
  // Its answer never tells success from failure, so every request counts.
  router.post('/api/auth/reset-request', limit({}));
  return router;
}

function limit(options: Partial<Options>): RequestHandler {
  return rateLimit({
    windowMs: WINDOW_MS,
    limit: ATTEMPTS,
    standardHeaders: false,
    legacyHeaders: false,
    ...options,
    handler: (_request, _response, next) => {
      next(
        new Refusal(
          'too-many',
          'Too many attempts from this network address. Wait a quarter of an hour and try again.',
          [],
          WINDOW_MS / 1000,
        ),
      );
    },
  });
}
