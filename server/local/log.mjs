const startedAt = Date.now();

/** One line on standard error with the seconds since the command began. */
export const log = (message) =>
  process.stderr.write(`[+${((Date.now() - startedAt) / 1000).toFixed(1)} s] ${message}\n`);

/** A failure that a person can mend: shown as its sentence, without a stack. */
export class UserError extends Error {}

/** What to print of any failure. */
export const explain = (error) => (error instanceof UserError ? error.message : error.stack);
