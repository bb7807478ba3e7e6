import { existsSync, readFileSync } from 'node:fs';
import { join, posix } from 'node:path';
import express, { Router, type RequestHandler } from 'express';
import { refuse } from './problems';
import { nonceOf } from './security-headers';

/** The builder puts a hash of eight letters and figures before the ending of what never changes. */
const HASHED_NAME = /-[A-Z0-9]{8}\.\w+$/;
const NONCE_PLACEHOLDER = '__CSP_NONCE__';

/**
 * The built client: its files as they are, and its one page for every other address, with the nonce of
 * this very reply written in. `index: false`, or the page would go out with the placeholder.
 */
export function serveWebClient(folder: string): Router {
  const router = Router();
  const page = servePage(join(folder, 'index.html'));
  router.use((request, response, next) => {
    // Served as a file it would go out with its placeholder.
    if (request.method === 'GET' && namesIndex(request.path)) page(request, response, next);
    else next();
  });
  router.use(
    express.static(folder, {
      index: false,
      setHeaders: (response, path) => {
        response.setHeader(
          'Cache-Control',
          HASHED_NAME.test(path) ? 'public, max-age=31536000, immutable' : 'no-cache',
        );
      },
    }),
  );
  router.get('/{*path}', (request, response, next) => {
    const namesFile = /\.\w+$/.test(request.path);
    if (namesFile || request.path.startsWith('/api/')) next();
    else page(request, response, next);
  });
  return router;
}

function namesIndex(path: string): boolean {
  return posix.normalize(decodeURIComponent(path)) === '/index.html';
}

function servePage(file: string): RequestHandler {
  const page = existsSync(file) ? readFileSync(file, 'utf8') : undefined;
  return (_request, response) => {
    if (page === undefined) {
      throw refuse('not-ready', 'The client is not built, so there is no page to show.', {
        next: 'Build it with "npm run build", or start everything with "npm start".',
      });
    }
    response.setHeader('Cache-Control', 'no-store');
    response.type('html').send(page.replaceAll(NONCE_PLACEHOLDER, nonceOf(response)));
  };
}
