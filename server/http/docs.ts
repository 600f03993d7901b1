import { dirname } from 'node:path';
import { static as serveFolder, type Request, type Response, type Router } from 'express';

/** Its folder only: loading the package itself would run the whole reader at every start. */
const READER = dirname(require.resolve('swagger-ui-dist/package.json'));

const PAGE = `<!doctype html>
<html lang="en">
  <head>
    <meta charset="utf-8" />
    <meta name="viewport" content="width=device-width, initial-scale=1" />
    <title>Underseam: the API</title>
    <link rel="stylesheet" href="/api/docs/swagger-ui.css" />
  </head>
  <body>
    <div id="api"></div>
    <script src="/api/docs/swagger-ui-bundle.js"></script>
    <script src="/api/docs/open.js"></script>
  </body>
</html>
`;

const OPEN = `window.SwaggerUIBundle({ url: '/api/openapi.json', dom_id: '#api', deepLinking: true, validatorUrl: null });
`;

/** Serves the description and a page to read it with, everything from this server so that it works offline. */
export function mountDocs(router: Router, description: () => unknown): void {
  let text: string | undefined;
  router.get('/api/openapi.json', (_request: Request, response: Response) => {
    text ??= JSON.stringify(description());
    response.type('application/json').send(text);
  });
  router.get('/api/docs', (_request: Request, response: Response) => {
    // The reader draws with inline style attributes: allowed here and nowhere else.
    response
      .set(
        'Content-Security-Policy',
        "default-src 'none'; script-src 'self'; style-src 'self' 'unsafe-inline'; img-src 'self' data:; connect-src 'self'; font-src 'self'; base-uri 'none'; frame-ancestors 'none'",
      )
      .type('html')
      .send(PAGE);
  });
  router.get('/api/docs/open.js', (_request: Request, response: Response) => {
    response.type('text/javascript').send(OPEN);
  });
  router.use('/api/docs', serveFolder(READER, { index: false, maxAge: '1d' }));
}
