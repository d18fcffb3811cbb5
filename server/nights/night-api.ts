import {
  nightPaths,
  nightSchema,
  nightSummarySchema,
  pageOf,
  pageQuerySchema,
  rigStateSchema,
  seriesQuerySchema,
  spectrumCurveSchema,
} from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = { method: 'get', tag: 'Nights', signedIn: true } as const;
const run = { ...about, params: z.object({ rigId: z.uuid(), runId: z.uuid() }) } as const;

export const nightApi: readonly Operation[] = [
  {
    ...about,
    path: nightPaths.rigStates,
    summary: 'How each rig of the account stands after its last night',
    answers: { 200: { description: 'One state a rig', schema: z.array(rigStateSchema) } },
    problems: [401],
  },
  {
    ...about,
    path: nightPaths.all('{rigId}'),
    summary: 'The nights of a rig, newest first',
    params: z.object({ rigId: z.uuid() }),
    query: pageQuerySchema,
    answers: { 200: { description: 'A page of nights', schema: pageOf(nightSummarySchema) } },
    problems: [400, 401, 404],
  },
  {
    ...about,
    path: nightPaths.one('{rigId}', '{date}'),
    summary: 'One night with its runs',
    params: z.object({ rigId: z.uuid(), date: z.iso.date() }),
    answers: { 200: { description: 'The night', schema: nightSchema } },
    problems: [400, 401, 404],
  },
  {
    ...run,
    path: nightPaths.series('{rigId}', '{runId}'),
    summary: 'A stretch of the series of a run, thinned to what a screen can show',
    query: seriesQuerySchema,
    answers: {
      200: {
        description: 'Little-endian: n, thinned, times, then the channels in the order asked for',
        schema: z.string().meta({ format: 'binary' }),
        contentType: 'application/octet-stream',
      },
    },
    problems: [400, 401, 404],
  },
  {
    ...run,
    path: nightPaths.spectrum('{rigId}', '{runId}'),
    summary: 'Amplitude by period of both axes',
    answers: { 200: { description: 'The curve', schema: spectrumCurveSchema } },
    problems: [400, 401, 404],
  },
];
