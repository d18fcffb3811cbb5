import { createRigSchema, rigPaths, rigSchema, updateRigSchema } from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = { tag: 'Rigs', signedIn: true } as const;
const one = {
  ...about,
  path: rigPaths.one('{rigId}'),
  params: z.object({ rigId: z.uuid() }),
} as const;
const rig = { description: 'The rig', schema: rigSchema };

export const rigApi: readonly Operation[] = [
  {
    ...about,
    method: 'get',
    path: rigPaths.all,
    summary: 'The rigs of the account, oldest first',
    answers: { 200: { description: 'The rigs', schema: z.array(rigSchema) } },
    problems: [401],
  },
  {
    ...about,
    method: 'post',
    path: rigPaths.all,
    summary: 'Describe a rig; who does owns it',
    body: { schema: createRigSchema },
    answers: { 201: rig },
    problems: [400, 401, 403],
  },
  {
    ...one,
    method: 'get',
    summary: 'One rig; its ETag is what If-Match asks for',
    answers: { 200: rig },
    problems: [400, 401, 404],
  },
  {
    ...one,
    method: 'put',
    summary: 'Change a rig',
    headers: z.object({ 'If-Match': z.string() }),
    body: { schema: updateRigSchema },
    answers: { 200: rig },
    problems: [400, 401, 403, 404, 412, 428],
  },
  {
    ...one,
    method: 'delete',
    summary: 'Delete a rig with everything that hangs on it',
    answers: { 204: { description: 'Deleted' } },
    problems: [400, 401, 403, 404],
  },
];
