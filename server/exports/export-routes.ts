import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { exportPaths } from '@stillpier/contract';
import { type Response, Router } from 'express';
import * as z from 'zod';
import { readParameters } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { Export, ExportService } from './export-service';

const rigParametersSchema = z.object({ rigId: z.uuid() });
const nightParametersSchema = z.object({ rigId: z.uuid(), date: z.iso.date() });
const importParametersSchema = z.object({ rigId: z.uuid(), importId: z.uuid() });

export function exportRoutes(exports: ExportService): Router {
  const router = Router();

  router.get(exportPaths.frames(':rigId', ':importId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, importId } = readParameters(importParametersSchema, req.params);
    await send(res, 'text/csv', await exports.frames(account.id, rigId, importId));
  });

  router.get(exportPaths.night(':rigId', ':date'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, date } = readParameters(nightParametersSchema, req.params);
    await send(res, 'application/zip', await exports.night(account.id, rigId, date));
  });

  router.get(exportPaths.rig(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    await send(res, 'application/zip', await exports.rig(account.id, rigId));
  });

  return router;
}

/** As it is made: a reader that is slow slows the making, and one that is gone ends it. */
async function send(res: Response, type: string, { fileName, content }: Export): Promise<void> {
  res.attachment(fileName).type(type);
  await pipeline(Readable.from(content, { objectMode: false }), res);
}
