import {
  columnMapFileQuerySchema,
  columnMapPathsOf,
  columnMapSchema,
  createColumnMapSchema,
  ownColumnMapPaths,
  ownColumnMapSchema,
  savedColumnMapSchema,
} from '@stillpier/contract';
import { type Request, Router } from 'express';
import * as z from 'zod';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { ColumnMapService } from './column-map-service';

const rigParametersSchema = z.object({ rigId: z.uuid() });
const mapParametersSchema = z.object({ mapId: z.uuid() });

/** The maps of a rig and those of a person: the same routes under two parents. */
interface Parent {
  readonly paths: ReturnType<typeof columnMapPathsOf>;
  readonly pathsFor: (req: Request) => ReturnType<typeof columnMapPathsOf>;
  /** null: the maps of the account. */
  readonly rigOf: (req: Request) => string | null;
  readonly schema: typeof ownColumnMapSchema | typeof savedColumnMapSchema;
}

const rigIdOf = (req: Request) => readParameters(rigParametersSchema, req.params).rigId;
const PARENTS: readonly Parent[] = [
  {
    paths: columnMapPathsOf(':rigId'),
    pathsFor: (req) => columnMapPathsOf(rigIdOf(req)),
    rigOf: rigIdOf,
    schema: savedColumnMapSchema,
  },
  {
    paths: ownColumnMapPaths,
    pathsFor: () => ownColumnMapPaths,
    rigOf: () => null,
    schema: ownColumnMapSchema,
  },
];

export function columnMapRoutes(maps: ColumnMapService): Router {
  return Router().use(...PARENTS.map((parent) => routesUnder(parent, maps)));
}

function routesUnder({ paths, pathsFor, rigOf, schema }: Parent, maps: ColumnMapService): Router {
  const router = Router();

  router.get(paths.all, async (req, res) => {
    const account = requireAccount(req);
    res.json(z.array(schema).parse(await maps.list(account.id, rigOf(req))));
  });

  router.post(paths.all, async (req, res) => {
    const account = requireAccount(req);
    const rigId = rigOf(req);
    const map = await maps.create(account.id, rigId, readRequest(createColumnMapSchema, req.body));
    res.status(201).location(pathsFor(req).one(map.id)).json(schema.parse(map));
  });

  router.post(paths.files, async (req, res) => {
    const account = requireAccount(req);
    const rigId = rigOf(req);
    const { name } = readRequest(columnMapFileQuerySchema, req.query);
    const sent = readRequest(columnMapSchema, req.body);
    const map = await maps.create(account.id, rigId, { name, headerCells: null, map: sent });
    res.status(201).location(pathsFor(req).one(map.id)).json(schema.parse(map));
  });

  router.get(paths.one(':mapId'), async (req, res) => {
    const account = requireAccount(req);
    const { mapId } = readParameters(mapParametersSchema, req.params);
    res.json(schema.parse(await maps.one(account.id, rigOf(req), mapId)));
  });

  router.get(paths.file(':mapId'), async (req, res) => {
    const account = requireAccount(req);
    const { mapId } = readParameters(mapParametersSchema, req.params);
    const { name, map } = await maps.one(account.id, rigOf(req), mapId);
    res.attachment(`${name}.json`).type('json');
    res.send(`${JSON.stringify(columnMapSchema.parse(map), null, 2)}\n`);
  });

  router.delete(paths.one(':mapId'), async (req, res) => {
    const account = requireAccount(req);
    const { mapId } = readParameters(mapParametersSchema, req.params);
    await maps.remove(account.id, rigOf(req), mapId);
    res.status(204).end();
  });

  return router;
}
