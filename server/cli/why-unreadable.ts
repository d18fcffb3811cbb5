import { Unusable } from './unusable';

const REASONS: Readonly<Record<string, (path: string) => string>> = {
  ENOENT: (path) => `There is no file "${path}".`,
  ENOTDIR: (path) => `There is no file "${path}".`,
  EISDIR: (path) => `"${path}" is a folder, not a file.`,
  EACCES: (path) => `The file "${path}" may not be read.`,
  EPERM: (path) => `The file "${path}" may not be read.`,
  Z_BUF_ERROR: (path) => `The compressed file "${path}" is cut off.`,
  Z_DATA_ERROR: (path) => `The compressed file "${path}" is damaged.`,
};

/** An error of the file system or of unpacking as a sentence; one that nobody foresaw stays as it is. */
export function whyUnreadable(path: string, error: unknown): unknown {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  const reason = REASONS[code];
  return reason ? new Unusable(reason(path)) : error;
}
