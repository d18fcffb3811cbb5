import { createRigSchema, rigPaths, rigSchema, updateRigSchema } from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import { requireVersion, versionTag } from '../http/version-tag';
import type { RigService } from './rig-service';

const parametersSchema = z.object({ rigId: z.uuid() });

export function rigRoutes(rigs: RigService): Router {
  const router = Router();

  router.get(rigPaths.all, async (req, res) => {
    const account = requireAccount(req);
    res.json(z.array(rigSchema).parse(await rigs.list(account.id)));
  });

  router.post(rigPaths.all, async (req, res) => {
    const account = requireAccount(req);
    const rig = await rigs.create(account.id, readRequest(createRigSchema, req.body));
    res.status(201).location(rigPaths.one(rig.id)).set('ETag', versionTag(rig.version));
    res.json(rigSchema.parse(rig));
  });

  router.get(rigPaths.one(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(parametersSchema, req.params);
    const rig = await rigs.one(account.id, rigId);
    res.set('ETag', versionTag(rig.version)).json(rigSchema.parse(rig));
  });

  router.put(rigPaths.one(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(parametersSchema, req.params);
    const version = requireVersion(req);
    const body = readRequest(updateRigSchema, req.body);
    const rig = await rigs.update(account.id, rigId, version, body);
    res.set('ETag', versionTag(rig.version)).json(rigSchema.parse(rig));
  });

  router.delete(rigPaths.one(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(parametersSchema, req.params);
    await rigs.remove(account.id, rigId);
    res.status(204).end();
  });

  return router;
}
