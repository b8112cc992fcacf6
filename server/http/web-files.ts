import { existsSync } from 'node:fs';
import { join } from 'node:path';
import express, { Router } from 'express';

/** Names that the build changes with the content: `main-5XZQ2R7A.js`. */
const HASHED = /-[A-Z0-9]{8}\.[a-z0-9]+$/;

const YEAR_S = 31_536_000;

/**
 * The built page. Files whose name says their content may be kept for ever, everything else is asked for again; any
 * other address that a browser opens is the page's own affair and gets its index.
 */
export function webFiles(folder: string): Router {
  const router = Router();
  const index = join(folder, 'index.html');
  router.use(
    express.static(folder, {
      index: false,
      setHeaders: (response, path) => {
        const isForEver = HASHED.test(path);
        response.setHeader('Cache-Control', isForEver ? `public, max-age=${YEAR_S}, immutable` : 'no-cache');
      },
    }),
  );
  router.get('/{*path}', (request, response, next) => {
    if (request.path.startsWith('/api/') || request.path === '/api' || !request.accepts('html'))
      return next();
    // A file that is not there is a mistake, not a page.
    if (/\.[a-z0-9]+$/i.test(request.path) && request.path !== '/index.html') return next();
    if (!existsSync(index)) return next();
    response.setHeader('Cache-Control', 'no-cache');
    response.sendFile(index);
  });
  return router;
}
