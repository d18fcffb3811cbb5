import { readFileSync } from 'node:fs';
import path from 'node:path';
import express, { Router } from 'express';
import { sendPage } from './security-headers';

const HASHED_NAME = /-[A-Z0-9]{8}\.(js|css|woff2|svg|png)$/;

/** The built client: its files, and its first page for every address that a person opens. */
export function webClient(folder: string, isHttps: boolean): Router {
  const router = Router();
  router.get('/{*page}', (req, res, next) => {
    const isFile = path.extname(req.path) !== '' && req.path !== '/index.html';
    if (isFile || !req.accepts('html')) {
      next();
      return;
    }
    const page = readFileSync(path.join(folder, 'index.html'), 'utf8');
    // Angular gives the nonce to each style sheet that it adds.
    sendPage(res, isHttps, (nonce) => page.replace('<app-root', `<app-root ngCspNonce="${nonce}"`));
  });
  router.use(
    express.static(folder, {
      index: false,
      setHeaders: (res, file) => {
        const hashed = HASHED_NAME.test(path.basename(file));
        res.set('Cache-Control', hashed ? 'public, max-age=31536000, immutable' : 'no-cache');
      },
    }),
  );
  return router;
}
