/** The exported web client: hashed files are kept for a year, every other address gets the page itself. */
import { join, resolve } from 'node:path';

import express, { Router } from 'express';

const YEAR_MS = 365 * 24 * 3_600_000;
/** Files that the export names by their content. */
const HASHED = /[.-][0-9a-f]{16,}\.[a-z0-9]+$/i;

/** Serves the folder `webRoot`; a path without a file name falls back to its page, one with a file name that is missing does not. */
export function serveWeb(webRoot: string): Router {
  const root = resolve(webRoot);
  const router = Router();
  router.use(
    express.static(root, {
      index: false,
      setHeaders: (res, path) => {
        res.setHeader('Cache-Control', HASHED.test(path) ? `public, max-age=${YEAR_MS / 1000}, immutable` : 'no-cache');
      },
    }),
  );
  router.get('/{*path}', (req, res, next) => {
    if (/\.[a-z0-9]+$/i.test(req.path)) {
      next();
      return;
    }
    res.setHeader('Cache-Control', 'no-cache');
    res.sendFile(join(root, 'index.html'), (error?: Error) => {
      if (error) next(error);
    });
  });
  return router;
}
