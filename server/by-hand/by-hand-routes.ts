import { byHandPaths, byHandSchema, changeByHandSchema, importPaths } from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { ByHandService } from './by-hand-service';

const parametersSchema = z.object({ rigId: z.uuid(), runId: z.uuid() });

export function byHandRoutes(byHand: ByHandService): Router {
  const router = Router();

  router.get(byHandPaths.of(':rigId', ':runId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, runId } = readParameters(parametersSchema, req.params);
    res.json(byHandSchema.parse(await byHand.of(account.id, rigId, runId)));
  });

  router.post(byHandPaths.of(':rigId', ':runId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, runId } = readParameters(parametersSchema, req.params);
    const change = readRequest(changeByHandSchema, req.body);
    const after = await byHand.change(account.id, rigId, runId, change);
    res.status(202).location(importPaths.one(rigId, after.importId));
    res.json(byHandSchema.parse(after));
  });

  return router;
}
