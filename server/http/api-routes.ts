import { Router } from 'express';
import * as z from 'zod';
import { writeApiPage } from './api-page';
import { buildOpenApi } from './openapi';
import type { Operation } from './operation';
import { sendPage } from './security-headers';

const DOCUMENT_PATH = '/api/v1/openapi.json';
const PAGE_PATH = '/api/v1/docs';

const service = { method: 'get', tag: 'Service', signedIn: false, problems: [] } as const;

/** What belongs to no resource. */
export const serviceApi: readonly Operation[] = [
  {
    ...service,
    path: DOCUMENT_PATH,
    summary: 'This description as an OpenAPI 3.1 document',
    answers: { 200: { description: 'The document', schema: z.looseObject({}) } },
  },
  {
    ...service,
    path: PAGE_PATH,
    summary: 'This description as a page',
    answers: { 200: { description: 'The page', schema: z.string(), contentType: 'text/html' } },
  },
  {
    ...service,
    path: '/healthz',
    summary: 'Whether the web process is alive',
    answers: { 200: { description: 'Alive', schema: z.strictObject({ alive: z.boolean() }) } },
  },
  {
    ...service,
    path: '/readyz',
    summary: 'Whether the web process can serve: its database answers',
    answers: {
      200: { description: 'Ready', schema: z.strictObject({ ready: z.boolean() }) },
      503: { description: 'Not ready', schema: z.strictObject({ ready: z.boolean() }) },
    },
  },
];

/** The description of the API, for programs and for people. */
export function apiRoutes(operations: readonly Operation[], isHttps: boolean): Router {
  const router = Router();
  const document = buildOpenApi(operations);
  router.get(DOCUMENT_PATH, (_req, res) => {
    res.json(document);
  });
  router.get(PAGE_PATH, (_req, res) => {
    sendPage(res, isHttps, (nonce) => writeApiPage(document, nonce));
  });
  return router;
}
