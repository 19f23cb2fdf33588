import { extname, join } from 'node:path';
import express, { Router } from 'express';

/** What a name with a content hash looks like, as the app's build makes it: `main-ABCDEFGH.js`. */
const hashedName = /-[A-Z0-9]{8}\.(?:js|css|woff2?|png|svg|webp|map)$/;

/**
 * Serves the built app. Everything without a content hash in its name is asked for again each time (an old
 * `ngsw.json` would keep tablets on an old build); what has one is kept for a year.
 */
export function serveApp(folder: string): Router {
  const router = Router();
  router.use(
    express.static(folder, {
      index: false,
      redirect: false,
      setHeaders: (res, path) => {
        const isHashed = hashedName.test(path);
        res.setHeader('Cache-Control', isHashed ? 'public, max-age=31536000, immutable' : 'no-cache');
      },
    }),
  );
  router.get('/{*path}', (req, res, next) => {
    if (!isPageOfTheApp(req.path)) {
      next();
      return;
    }
    res.sendFile(
      join(folder, 'index.html'),
      { cacheControl: false, headers: { 'Cache-Control': 'no-cache' } },
      (error) => {
        // Without a built app there is no page: the same answer as for any unknown address.
        if (error != null && !res.headersSent) next();
      },
    );
  });
  return router;
}

/**
 * Whether the app's own router answers this address. Never for a file: a page in place of a missing chunk or
 * `ngsw.json` makes service workers throw their caches away.
 */
export function isPageOfTheApp(path: string): boolean {
  return extname(path) === '' && !/^\/(?:api|ngsw|mail|healthz|readyz)(?:[/-]|$)/.test(path);
}
