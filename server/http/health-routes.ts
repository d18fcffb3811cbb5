import { Router } from 'express';
import type { Knex } from 'knex';

/** For whoever keeps the process running: is it alive, and can it serve. */
export function healthRoutes(knex: Knex): Router {
  const router = Router();
  router.get('/healthz', (_req, res) => {
    res.json({ alive: true });
  });
  router.get('/readyz', async (_req, res) => {
    const ready = await knex.raw('SELECT 1').then(
      () => true,
      () => false, // the answer says so; the database's own trouble is logged elsewhere
    );
    res.status(ready ? 200 : 503).json({ ready });
  });
  return router;
}
