import * as z from 'zod';
import { columnMapSchema } from './column-map';

export const IMPORT_STATES = ['waiting', 'running', 'done', 'failed'] as const;

/** The `options` field of the multipart upload, as JSON text; the `file` field comes after it. */
export const importOptionsSchema = z.strictObject({
  setupId: z.uuid().nullable().describe('null: the first setup of the rig'),
  map: columnMapSchema.nullable().describe('null: recognised headers, or a saved map of the rig'),
});
export type ImportOptions = z.infer<typeof importOptionsSchema>;

/** Read the kept original again; what is not given stays as it was. */
export const retryImportSchema = importOptionsSchema.partial();
export type RetryImport = z.infer<typeof retryImportSchema>;

export const logImportSchema = z
  .strictObject({
    id: z.uuid(),
    rigId: z.uuid(),
    setupId: z.uuid().nullable(),
    fileName: z.string(),
    sizeBytes: z.int(),
    sha256: z.string(),
    state: z.enum(IMPORT_STATES),
    progress: z.number().min(0).max(1),
    stage: z.string().describe('What is being done, in words'),
    error: z.string().nullable().describe('One sentence, when failed'),
    attempt: z.int(),
    lines: z.int().nullable(),
    frames: z.int().nullable(),
    refusedCount: z.int().nullable(),
    nights: z.array(z.iso.date()).describe('Evening dates that the log gave runs to'),
    duplicate: z.boolean().describe('Whether the answer is about a file that the rig had already'),
    createdAt: z.iso.datetime(),
  })
  .meta({ id: 'LogImport' });
export type LogImport = z.infer<typeof logImportSchema>;

/** One Server-Sent Event named `import`: the import as it now stands. */
export const importEventSchema = logImportSchema;

export const importPaths = {
  all: (rigId: string) => `/api/v1/rigs/${rigId}/imports`,
  one: (rigId: string, importId: string) => `/api/v1/rigs/${rigId}/imports/${importId}`,
  events: (rigId: string) => `/api/v1/rigs/${rigId}/import-events`,
  retries: (rigId: string, importId: string) => `/api/v1/rigs/${rigId}/imports/${importId}/retries`,
  original: (rigId: string, importId: string) =>
    `/api/v1/rigs/${rigId}/imports/${importId}/original`,
  document: (rigId: string, importId: string) =>
    `/api/v1/rigs/${rigId}/imports/${importId}/document`,
} as const;

/** Pages of the client that e-mails lead to. */
export const importPages = {
  all: (rigId: string) => `/rigs/${rigId}/import`,
  night: (rigId: string, date: string) => `/rigs/${rigId}/nights/${date}`,
} as const;
