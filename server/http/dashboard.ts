import { randomBytes } from 'node:crypto';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { static as serveFolder, type Request, type Response, type Router } from 'express';

const NOT_BUILT = `The pages are not built. Run "npm start", or "npm run dev" while developing.
`;

/** Serves the built dashboard: its files for a year by their hashed names, its page anew each time with a nonce of its own. */
export function mountDashboard(router: Router, folder: string): void {
  const file = join(folder, 'index.html');
  const page = existsSync(file) ? readFileSync(file, 'utf8') : undefined;
  router.use(
    serveFolder(folder, {
      index: false,
      setHeaders: (response, path) => {
        const hashed = /-[A-Z0-9]{8}\.\w+$/.test(path);
        response.setHeader(
          'Cache-Control',
          hashed ? 'public, max-age=31536000, immutable' : 'no-cache',
        );
      },
    }),
  );
  router.get('/{*any}', (request: Request, response: Response) => {
    if (page === undefined) {
      response.status(503).type('text/plain').send(NOT_BUILT);
      return;
    }
    if (/\.\w{2,5}$/.test(request.path)) {
      response.status(404).type('text/plain').send('There is no such file.\n');
      return;
    }
    const nonce = randomBytes(18).toString('base64');
    response
      .set('Content-Security-Policy', policy(nonce))
      .set('Cache-Control', 'no-store')
      .type('html')
      .send(page.replaceAll('CSP_NONCE', nonce));
  });
}

function policy(nonce: string): string {
  return [
    "default-src 'self'",
    "script-src 'self'",
    `style-src 'self' 'nonce-${nonce}'`,
    "img-src 'self' data: blob:",
    "font-src 'self'",
    "connect-src 'self'",
    "object-src 'none'",
    "base-uri 'self'",
    "form-action 'self'",
    "frame-ancestors 'none'",
    "require-trusted-types-for 'script'",
    'trusted-types angular angular#bundler angular#unsafe-bypass angular#components underseam',
  ].join('; ');
}
