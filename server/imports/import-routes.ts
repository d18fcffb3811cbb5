import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import {
  analysisDocumentSchema,
  importPaths,
  logImportSchema,
  pageOf,
  pageQuerySchema,
  retryImportSchema,
} from '@stillpier/contract';
import { Router } from 'express';
import * as z from 'zod';
import { bearerOf } from '../http/bearer';
import type { Limits } from '../http/limits';
import { readParameters, readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import type { ImportEvents } from './import-events';
import type { ImportService } from './import-service';
import type { UploadService } from './upload-service';

const importPageSchema = pageOf(logImportSchema);
const rigParametersSchema = z.object({ rigId: z.uuid() });
const parametersSchema = z.object({ rigId: z.uuid(), importId: z.uuid() });

interface ImportParts {
  readonly imports: ImportService;
  readonly uploads: UploadService;
  readonly events: ImportEvents;
  readonly limits: Limits;
}

export function importRoutes({ imports, uploads, events, limits }: ImportParts): Router {
  const router = Router();

  router.get(importPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    const query = readRequest(pageQuerySchema, req.query);
    res.json(importPageSchema.parse(await imports.list(account.id, rigId, query)));
  });

  router.post(importPaths.all(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    await limits.take('uploadByAccount', account.id);
    const sender = { accountId: account.id, mails: bearerOf(req)?.mails ?? null };
    const received = await uploads.receive(sender, rigId, req, res);
    res.status(received.duplicate ? 200 : 202).location(importPaths.one(rigId, received.id));
    res.json(logImportSchema.parse(received));
  });

  router.get(importPaths.events(':rigId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId } = readParameters(rigParametersSchema, req.params);
    await events.follow(account.id, rigId, res);
  });

  router.get(importPaths.one(':rigId', ':importId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, importId } = readParameters(parametersSchema, req.params);
    res.json(logImportSchema.parse(await imports.one(account.id, rigId, importId)));
  });

  router.delete(importPaths.one(':rigId', ':importId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, importId } = readParameters(parametersSchema, req.params);
    await imports.remove(account.id, rigId, importId);
    res.status(204).end();
  });

  router.post(importPaths.retries(':rigId', ':importId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, importId } = readParameters(parametersSchema, req.params);
    const changes = readRequest(retryImportSchema, req.body ?? {});
    const again = await imports.readAgain(account.id, rigId, importId, changes);
    res.status(202).location(importPaths.one(rigId, importId)).json(logImportSchema.parse(again));
  });

  router.get(importPaths.original(':rigId', ':importId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, importId } = readParameters(parametersSchema, req.params);
    const { fileName, sizeBytes, bytes } = await imports.original(account.id, rigId, importId);
    // Never as something that a browser would show: it is what somebody sent.
    res.attachment(fileName).type('application/octet-stream').set('Content-Length', `${sizeBytes}`);
    await pipeline(Readable.from(bytes, { objectMode: false }), res);
  });

  router.get(importPaths.document(':rigId', ':importId'), async (req, res) => {
    const account = requireAccount(req);
    const { rigId, importId } = readParameters(parametersSchema, req.params);
    const { fileName, document } = await imports.document(account.id, rigId, importId);
    res.attachment(`${fileName}.json`).json(analysisDocumentSchema.parse(document));
  });

  return router;
}
