import { createSetupSchema, setupPaths, setupSchema, updateSetupSchema } from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = { tag: 'Setups', signedIn: true } as const;
const all = {
  ...about,
  path: setupPaths.all('{rigId}'),
  params: z.object({ rigId: z.uuid() }),
} as const;
const one = {
  ...about,
  path: setupPaths.one('{rigId}', '{setupId}'),
  params: z.object({ rigId: z.uuid(), setupId: z.uuid() }),
} as const;
const setup = { description: 'The setup', schema: setupSchema };

export const setupApi: readonly Operation[] = [
  {
    ...all,
    method: 'get',
    summary: 'The setups of a rig, oldest first',
    answers: { 200: { description: 'The setups', schema: z.array(setupSchema) } },
    problems: [400, 401, 404],
  },
  {
    ...all,
    method: 'post',
    summary: 'Describe a setup',
    body: { schema: createSetupSchema },
    answers: { 201: setup },
    problems: [400, 401, 403, 404],
  },
  {
    ...one,
    method: 'get',
    summary: 'One setup; its ETag is what If-Match asks for',
    answers: { 200: setup },
    problems: [400, 401, 404],
  },
  {
    ...one,
    method: 'put',
    summary: 'Change a setup',
    headers: z.object({ 'If-Match': z.string() }),
    body: { schema: updateSetupSchema },
    answers: { 200: setup },
    problems: [400, 401, 403, 404, 412, 428],
  },
  {
    ...one,
    method: 'delete',
    summary: 'Delete a setup; the runs that were guided with it stay',
    answers: { 204: { description: 'Deleted' } },
    problems: [400, 401, 403, 404],
  },
];
