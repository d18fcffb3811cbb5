import { exportPaths } from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = {
  method: 'get',
  tag: 'Ways out',
  signedIn: true,
  problems: [400, 401, 404],
} as const;
const zip = {
  200: {
    description: 'A ZIP file with original, frames.csv and analysis.json of each log',
    schema: z.string().meta({ format: 'binary' }),
    contentType: 'application/zip',
  },
};

export const exportApi: readonly Operation[] = [
  {
    ...about,
    path: exportPaths.frames('{rigId}', '{importId}'),
    problems: [...about.problems, 409],
    summary: 'The frames of a log as CSV, under headers that can be read in again',
    params: z.object({ rigId: z.uuid(), importId: z.uuid() }),
    answers: { 200: { description: 'The frames', schema: z.string(), contentType: 'text/csv' } },
  },
  {
    ...about,
    path: exportPaths.night('{rigId}', '{date}'),
    summary: 'Everything of the logs of a night',
    params: z.object({ rigId: z.uuid(), date: z.iso.date() }),
    answers: zip,
  },
  {
    ...about,
    path: exportPaths.rig('{rigId}'),
    summary: 'Everything of all logs of a rig',
    params: z.object({ rigId: z.uuid() }),
    answers: zip,
  },
];
