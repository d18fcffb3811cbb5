import type { Request } from 'express';
import { AppError, badInput } from './app-error';

/** The ETag of a row with a version, as in `"7"`. */
export function versionTag(version: number): string {
  return `"${version}"`;
}

/**
 * The version that the caller has seen, from If-Match: 428 when it is missing. Whether it still
 * holds is asked by the update itself, which throws `staleVersion()` when no row has that version.
 */
export function requireVersion(req: Request): number {
  const header = req.get('if-match');
  if (header === undefined) {
    const detail = 'Send If-Match with the ETag of what you have read.';
    throw new AppError(428, 'version-required', detail);
  }
  // A proxy that compresses makes the tag weak; the version in it is still the one that was read.
  const version = /^(?:W\/)?"(\d{1,9})"$/.exec(header)?.[1];
  if (version === undefined) throw badInput('If-Match needs one ETag of ours, such as "7".');
  return Number(version);
}
