import {
  analysisDocumentSchema,
  importEventSchema,
  importPaths,
  logImportSchema,
  pageOf,
  pageQuerySchema,
  retryImportSchema,
} from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = { tag: 'Imports', signedIn: true } as const;
const ofRig = { ...about, params: z.object({ rigId: z.uuid() }) } as const;
const ofImport = { ...about, params: z.object({ rigId: z.uuid(), importId: z.uuid() }) } as const;
const one = importPaths.one('{rigId}', '{importId}');

const uploadSchema = z.object({
  options: z.string().optional().describe('ImportOptions as JSON; stands before the file'),
  file: z.string().meta({ format: 'binary' }).describe('The guide log'),
});

export const importApi: readonly Operation[] = [
  {
    ...ofRig,
    method: 'get',
    path: importPaths.all('{rigId}'),
    summary: 'The imports of a rig, newest first',
    query: pageQuerySchema,
    answers: { 200: { description: 'A page of imports', schema: pageOf(logImportSchema) } },
    problems: [400, 401, 404],
  },
  {
    ...ofRig,
    method: 'post',
    path: importPaths.all('{rigId}'),
    byUploadToken: true,
    summary: 'Send a guide log',
    body: { schema: uploadSchema, contentType: 'multipart/form-data' },
    answers: {
      200: { description: 'The rig has this file already: its import', schema: logImportSchema },
      202: { description: 'Kept, and waiting to be read', schema: logImportSchema },
    },
    problems: [400, 401, 403, 404, 409, 413, 429],
  },
  {
    ...ofRig,
    method: 'get',
    path: importPaths.events('{rigId}'),
    summary: 'Server-Sent Events named `import`: the latest imports, then each change',
    answers: {
      200: { description: 'Events', schema: importEventSchema, contentType: 'text/event-stream' },
    },
    problems: [400, 401, 404],
  },
  {
    ...ofImport,
    method: 'get',
    path: one,
    byUploadToken: true,
    summary: 'One import',
    answers: { 200: { description: 'The import', schema: logImportSchema } },
    problems: [400, 401, 404],
  },
  {
    ...ofImport,
    method: 'delete',
    path: one,
    summary: 'Delete an import with its original and its runs',
    answers: { 204: { description: 'Deleted' } },
    problems: [400, 401, 403, 404],
  },
  {
    ...ofImport,
    method: 'post',
    path: importPaths.retries('{rigId}', '{importId}'),
    summary: 'Read the kept original again; what is not given stays as it was',
    body: { schema: retryImportSchema },
    answers: { 202: { description: 'Waiting to be read', schema: logImportSchema } },
    problems: [400, 401, 403, 404, 409],
  },
  {
    ...ofImport,
    method: 'get',
    path: importPaths.original('{rigId}', '{importId}'),
    summary: 'The file as it was sent, byte for byte',
    answers: {
      200: {
        description: 'The file',
        schema: z.string().meta({ format: 'binary' }),
        contentType: 'application/octet-stream',
      },
    },
    problems: [400, 401, 404],
  },
  {
    ...ofImport,
    method: 'get',
    path: importPaths.document('{rigId}', '{importId}'),
    summary: 'The analysis document',
    answers: { 200: { description: 'The document', schema: analysisDocumentSchema } },
    problems: [400, 401, 404],
  },
];
