import { createSetupSchema, setupPaths, setupSchema, updateSetupSchema } from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import { requireVersion, versionTag } from '../http/version-tag';
import type { SetupService } from './setup-service';

const rigParametersSchema = z.object({ rigId: z.uuid() });
const parametersSchema = z.object({ rigId: z.uuid(), setupId: z.uuid() });

export function setupRoutes(setups: SetupService): Router {
  const router = Router();

  router.get(setupPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    res.json(z.array(setupSchema).parse(await setups.list(account.id, rigId)));
  });

  router.post(setupPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    const body = readRequest(createSetupSchema, req.body);
    const setup = await setups.create(account.id, rigId, body);
    res
      .status(201)
      .location(setupPaths.one(rigId, setup.id))
      .set('ETag', versionTag(setup.version));
    res.json(setupSchema.parse(setup));
  });

  router.get(setupPaths.one(':rigId', ':setupId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, setupId } = readParameters(parametersSchema, req.params);
    const setup = await setups.one(account.id, rigId, setupId);
    res.set('ETag', versionTag(setup.version)).json(setupSchema.parse(setup));
  });

  router.put(setupPaths.one(':rigId', ':setupId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, setupId } = readParameters(parametersSchema, req.params);
    const version = requireVersion(req);
    const body = readRequest(updateSetupSchema, req.body);
    const setup = await setups.update(account.id, rigId, setupId, version, body);
    res.set('ETag', versionTag(setup.version)).json(setupSchema.parse(setup));
  });

  router.delete(setupPaths.one(':rigId', ':setupId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, setupId } = readParameters(parametersSchema, req.params);
    await setups.remove(account.id, rigId, setupId);
    res.status(204).end();
  });

  return router;
}
