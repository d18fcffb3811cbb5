import { columnMapPaths, createColumnMapSchema, savedColumnMapSchema } from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = { tag: 'Column maps', signedIn: true } as const;
const all = {
  ...about,
  path: columnMapPaths.all('{rigId}'),
  params: z.object({ rigId: z.uuid() }),
} as const;
const one = {
  ...about,
  path: columnMapPaths.one('{rigId}', '{mapId}'),
  params: z.object({ rigId: z.uuid(), mapId: z.uuid() }),
} as const;
const map = { description: 'The column map', schema: savedColumnMapSchema };

export const columnMapApi: readonly Operation[] = [
  {
    ...all,
    method: 'get',
    summary: 'The column maps of a rig, newest first',
    answers: { 200: { description: 'The column maps', schema: z.array(savedColumnMapSchema) } },
    problems: [400, 401, 404],
  },
  {
    ...all,
    method: 'post',
    summary: 'Save a column map; it is tried on the next file with the same header line',
    body: { schema: createColumnMapSchema },
    answers: { 201: map },
    problems: [400, 401, 403, 404],
  },
  {
    ...one,
    method: 'get',
    summary: 'One column map',
    answers: { 200: map },
    problems: [400, 401, 404],
  },
  {
    ...one,
    method: 'delete',
    summary: 'Delete a column map',
    answers: { 204: { description: 'Deleted' } },
    problems: [400, 401, 403, 404],
  },
];
