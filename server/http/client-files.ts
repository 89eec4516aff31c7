import { existsSync } from 'node:fs';
import path from 'node:path';
import express, { type Response, type Router } from 'express';

const yearMs = 365 * 24 * 3_600_000;

/**
 * Serves the built client. Hashed files never change; everything else is asked for again each time, above all the
 * service worker. A missing asset is missing: a page in its place would be kept as a script for good.
 */
export function serveClient(router: Router, folder: string): void {
  router.use(
    '/assets',
    express.static(path.join(folder, 'assets'), {
      immutable: true,
      maxAge: yearMs,
      index: false,
      redirect: false,
    }),
    (_request, response) => gone(response),
  );
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders: (response) => response.setHeader('cache-control', 'no-cache'),
    }),
  );
  const page = path.join(folder, 'index.html');
  router.get('/{*path}', (request, response) => {
    if (path.extname(request.path) !== '' || !existsSync(page)) {
      gone(response);
      return;
    }
    response.set('cache-control', 'no-cache').sendFile(page);
  });
}

function gone(response: Response): void {
  response.status(404).set('cache-control', 'no-store').type('text/plain').send('Not there.');
}
