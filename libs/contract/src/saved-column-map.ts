import * as z from 'zod';
import { columnMapSchema } from './column-map';

const savedColumnMapFields = {
  name: z.string().trim().min(1, 'needs a name').max(80),
  headerCells: z
    .array(z.string().max(200))
    .max(200)
    .describe('The header line that the map recognises; empty for files without one'),
  map: columnMapSchema,
};

export const createColumnMapSchema = z.strictObject(savedColumnMapFields);
export type CreateColumnMap = z.infer<typeof createColumnMapSchema>;

export const savedColumnMapSchema = z
  .strictObject({
    ...savedColumnMapFields,
    id: z.uuid(),
    rigId: z.uuid(),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'SavedColumnMap' });
export type SavedColumnMap = z.infer<typeof savedColumnMapSchema>;

export const columnMapPaths = {
  all: (rigId: string) => `/api/v1/rigs/${rigId}/column-maps`,
  one: (rigId: string, mapId: string) => `/api/v1/rigs/${rigId}/column-maps/${mapId}`,
} as const;
