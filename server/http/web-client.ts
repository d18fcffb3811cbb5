import path from 'node:path';
import express, { type RequestHandler, Router } from 'express';

const HASHED_NAME = /-[A-Z0-9]{8}\.(js|css|woff2|svg|png)$/;

/** The built client: its files, and its first page for every address that a person opens. */
export function webClient(folder: string): Router {
  const router = Router();
  router.use(
    express.static(folder, {
      index: false,
      setHeaders: (res, file) => {
        const hashed = HASHED_NAME.test(path.basename(file));
        res.set('Cache-Control', hashed ? 'public, max-age=31536000, immutable' : 'no-cache');
      },
    }),
  );
  router.get('/{*page}', firstPage(folder));
  return router;
}

function firstPage(folder: string): RequestHandler {
  return (req, res, next) => {
    const isFile = path.extname(req.path) !== '';
    if (isFile || req.accepts(['html']) === false) next();
    else res.set('Cache-Control', 'no-cache').sendFile('index.html', { root: folder });
  };
}
