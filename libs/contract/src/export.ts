/** Ways out beside the original and the document of an import (importPaths); each is sent as it is made. */
export const exportPaths = {
  /** GET: text/csv, the frames of a log as they were analysed, under headers that are recognised without a map. */
  frames: (rigId: string, importId: string) => `/api/v1/rigs/${rigId}/imports/${importId}/frames`,
  /** GET: application/zip, the logs of a night: each with original, frames and document. */
  night: (rigId: string, date: string) => `/api/v1/rigs/${rigId}/nights/${date}/archive`,
  /** GET: application/zip, the same of every log of a rig. */
  rig: (rigId: string) => `/api/v1/rigs/${rigId}/archive`,
} as const;
