import * as z from 'zod';

export const SENSORS = ['mono', 'one-shot colour'] as const;

const opticsFields = {
  focalLengthMm: z.number().min(10).max(20_000),
  apertureMm: z.number().min(5).max(10_000),
  pixelUm: z.number().min(0.5).max(50),
  binning: z.int().min(1).max(8),
};

export const filterSchema = z.strictObject({
  name: z.string().trim().min(1, 'needs a name').max(60),
  subSeconds: z.number().min(1).max(3600).describe('Usual length of one sub'),
});
export type Filter = z.infer<typeof filterSchema>;

const setupFields = {
  name: z.string().trim().min(1, 'needs a name').max(80),
  imaging: z.strictObject({ ...opticsFields, sensor: z.enum(SENSORS) }),
  filters: z.array(filterSchema).max(20),
  guiding: z.strictObject(opticsFields),
  seeingFwhmArcsec: z
    .number()
    .min(0.3)
    .max(15)
    .nullable()
    .describe('Long-exposure star size without guide error'),
  subSeconds: z.number().min(1).max(3600).describe('Length of one sub for the sub forecast'),
  keepAspect: z.number().min(1.01).max(3).describe('Largest aspect ratio that is kept'),
};

export const createSetupSchema = z.strictObject(setupFields);
export type CreateSetup = z.infer<typeof createSetupSchema>;
export const updateSetupSchema = createSetupSchema;

export const setupSchema = z
  .strictObject({
    ...setupFields,
    id: z.uuid(),
    rigId: z.uuid(),
    version: z.int().describe('Raised by each change; the ETag'),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'Setup' });
export type Setup = z.infer<typeof setupSchema>;

export const setupPaths = {
  all: (rigId: string) => `/api/v1/rigs/${rigId}/setups`,
  one: (rigId: string, setupId: string) => `/api/v1/rigs/${rigId}/setups/${setupId}`,
} as const;
