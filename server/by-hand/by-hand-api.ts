import { byHandPaths, byHandSchema, changeByHandSchema } from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = {
  tag: 'Nights',
  signedIn: true,
  path: byHandPaths.of('{rigId}', '{runId}'),
  params: z.object({ rigId: z.uuid(), runId: z.uuid() }),
} as const;

export const byHandApi: readonly Operation[] = [
  {
    ...about,
    method: 'get',
    summary: 'What people set aside of a run, with who, when and why',
    answers: { 200: { description: 'The stretches and their history', schema: byHandSchema } },
    problems: [400, 401, 404],
  },
  {
    ...about,
    method: 'post',
    summary: 'Set a stretch of a run aside, or take it back; the figures are computed anew',
    body: { schema: changeByHandSchema },
    answers: { 202: { description: 'Noted; Location is the import', schema: byHandSchema } },
    problems: [400, 401, 403, 404, 409, 422],
  },
];
