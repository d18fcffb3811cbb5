import * as z from 'zod';
import { columnMapSchema } from './column-map';

const savedColumnMapFields = {
  name: z.string().trim().min(1, 'needs a name').max(80),
  headerCells: z
    .array(z.string().max(200))
    .max(200)
    .nullable()
    .describe(
      'The header line that the map recognises; empty for files without one. ' +
        'null (it came as a file): it recognises every header line that has all columns that it names',
    ),
  map: columnMapSchema,
};

export const createColumnMapSchema = z.strictObject(savedColumnMapFields);
export type CreateColumnMap = z.infer<typeof createColumnMapSchema>;

/** A map of a person, for all their rigs. */
export const ownColumnMapSchema = z
  .strictObject({ ...savedColumnMapFields, id: z.uuid(), createdAt: z.iso.datetime() })
  .meta({ id: 'OwnColumnMap' });
export type OwnColumnMap = z.infer<typeof ownColumnMapSchema>;

/** A map of a rig, for all who send its logs; it goes before those of a person. */
export const savedColumnMapSchema = ownColumnMapSchema
  .extend({ rigId: z.uuid() })
  .meta({ id: 'SavedColumnMap' });
export type SavedColumnMap = z.infer<typeof savedColumnMapSchema>;

/** Query of a MAP.json that is sent as it is. */
export const columnMapFileQuerySchema = z.strictObject({ name: savedColumnMapFields.name });

const columnMapPathsUnder = (parent: string) => ({
  /** GET: 200, newest first; POST createColumnMapSchema: 201. */
  all: `${parent}/column-maps`,
  /** POST columnMapSchema (a MAP.json) with columnMapFileQuerySchema: 201. */
  files: `${parent}/column-maps/files`,
  /** GET: 200; DELETE: 204. */
  one: (mapId: string) => `${parent}/column-maps/${mapId}`,
  /** GET: 200 ColumnMap, as a file to keep: a MAP.json. */
  file: (mapId: string) => `${parent}/column-maps/${mapId}/file`,
});

export const ownColumnMapPaths = columnMapPathsUnder('/api/v1/account');
export const columnMapPathsOf = (rigId: string) => columnMapPathsUnder(`/api/v1/rigs/${rigId}`);

export const columnMapPaths = {
  all: (rigId: string) => columnMapPathsOf(rigId).all,
  one: (rigId: string, mapId: string) => columnMapPathsOf(rigId).one(mapId),
} as const;
