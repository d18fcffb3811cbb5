import {
  columnMapFileQuerySchema,
  columnMapPathsOf,
  columnMapSchema,
  createColumnMapSchema,
  ownColumnMapPaths,
  ownColumnMapSchema,
  savedColumnMapSchema,
} from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

interface Parent {
  readonly whose: string;
  readonly paths: ReturnType<typeof columnMapPathsOf>;
  readonly params: { readonly rigId?: z.ZodUUID };
  readonly schema: z.ZodType;
}

const PARENTS: readonly Parent[] = [
  {
    whose: 'of a rig',
    paths: columnMapPathsOf('{rigId}'),
    params: { rigId: z.uuid() },
    schema: savedColumnMapSchema,
  },
  {
    whose: 'of the account, for all its rigs',
    paths: ownColumnMapPaths,
    params: {},
    schema: ownColumnMapSchema,
  },
];

export const columnMapApi: readonly Operation[] = PARENTS.flatMap(operationsUnder);

function operationsUnder({ whose, paths, params, schema }: Parent): Operation[] {
  const about = { tag: 'Column maps', signedIn: true, params: z.object(params) } as const;
  const ofMap = { ...about, params: z.object({ ...params, mapId: z.uuid() }) } as const;
  const map = { description: 'The column map', schema };
  return [
    {
      ...about,
      method: 'get',
      path: paths.all,
      summary: `The column maps ${whose}, newest first`,
      answers: { 200: { description: 'The column maps', schema: z.array(schema) } },
      problems: [400, 401, 404],
    },
    {
      ...about,
      method: 'post',
      path: paths.all,
      summary: `Save a column map ${whose}; it is tried on the next file with the same header line`,
      body: { schema: createColumnMapSchema },
      answers: { 201: map },
      problems: [400, 401, 403, 404],
    },
    {
      ...about,
      method: 'post',
      path: paths.files,
      summary: `Save a MAP.json as a column map ${whose}`,
      query: columnMapFileQuerySchema,
      body: { schema: columnMapSchema },
      answers: { 201: map },
      problems: [400, 401, 403, 404],
    },
    {
      ...ofMap,
      method: 'get',
      path: paths.one('{mapId}'),
      summary: `One column map ${whose}`,
      answers: { 200: map },
      problems: [400, 401, 404],
    },
    {
      ...ofMap,
      method: 'get',
      path: paths.file('{mapId}'),
      summary: `One column map ${whose} as a file: a MAP.json`,
      answers: { 200: { description: 'The map alone', schema: columnMapSchema } },
      problems: [400, 401, 404],
    },
    {
      ...ofMap,
      method: 'delete',
      path: paths.one('{mapId}'),
      summary: `Delete a column map ${whose}`,
      answers: { 204: { description: 'Deleted' } },
      problems: [400, 401, 403, 404],
    },
  ];
}
