import {
  accessTokenPaths,
  accessTokenSchema,
  createAccessTokenSchema,
  newAccessTokenSchema,
  updateAccessTokenSchema,
} from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { AccessTokenService } from './access-token-service';

const parametersSchema = z.object({ tokenId: z.uuid() });

export function accessTokenRoutes(tokens: AccessTokenService): Router {
  const router = Router();

  router.get(accessTokenPaths.all, async (req, res) => {
    const account = requireAccount(req);
    res.json(z.array(accessTokenSchema).parse(await tokens.list(account.id)));
  });

  router.post(accessTokenPaths.all, async (req, res) => {
    const account = requireAccount(req);
    const made = await tokens.create(account.id, readRequest(createAccessTokenSchema, req.body));
    res.status(201).location(accessTokenPaths.one(made.id)).set('Cache-Control', 'no-store');
    res.json(newAccessTokenSchema.parse(made));
  });

  router.patch(accessTokenPaths.one(':tokenId'), async (req, res) => {
    const account = requireAccount(req);
    const { tokenId } = readParameters(parametersSchema, req.params);
    const changes = readRequest(updateAccessTokenSchema, req.body);
    res.json(accessTokenSchema.parse(await tokens.update(account.id, tokenId, changes)));
  });

  router.delete(accessTokenPaths.one(':tokenId'), async (req, res) => {
    const account = requireAccount(req);
    const { tokenId } = readParameters(parametersSchema, req.params);
    await tokens.revoke(account.id, tokenId);
    res.status(204).end();
  });

  return router;
}
