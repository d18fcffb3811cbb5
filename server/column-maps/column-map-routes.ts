import { columnMapPaths, createColumnMapSchema, savedColumnMapSchema } from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { ColumnMapService } from './column-map-service';

const rigParametersSchema = z.object({ rigId: z.uuid() });
const parametersSchema = z.object({ rigId: z.uuid(), mapId: z.uuid() });

export function columnMapRoutes(maps: ColumnMapService): Router {
  const router = Router();

  router.get(columnMapPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readRequest(rigParametersSchema, req.params);
    res.json(z.array(savedColumnMapSchema).parse(await maps.list(account.id, rigId)));
  });

  router.post(columnMapPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readRequest(rigParametersSchema, req.params);
    const body = readRequest(createColumnMapSchema, req.body);
    const map = await maps.create(account.id, rigId, body);
    res.status(201).location(columnMapPaths.one(rigId, map.id));
    res.json(savedColumnMapSchema.parse(map));
  });

  router.get(columnMapPaths.one(':rigId', ':mapId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, mapId } = readRequest(parametersSchema, req.params);
    res.json(savedColumnMapSchema.parse(await maps.one(account.id, rigId, mapId)));
  });

  router.delete(columnMapPaths.one(':rigId', ':mapId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, mapId } = readRequest(parametersSchema, req.params);
    await maps.remove(account.id, rigId, mapId);
    res.status(204).end();
  });

  return router;
}
