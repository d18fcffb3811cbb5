import { Router } from 'express';

/** For whoever keeps the process running: is it alive, and can it serve. */
export function healthRoutes(isReady: () => Promise<boolean>): Router {
  const router = Router();
  router.get('/healthz', (_req, res) => {
    res.json({ alive: true });
  });
  router.get('/readyz', async (_req, res) => {
    const ready = await isReady();
    res.status(ready ? 200 : 503).json({ ready });
  });
  return router;
}
