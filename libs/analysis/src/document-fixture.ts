import { type Reading } from './analysis-document';

/** What reading found, where a spec has read nothing. */
export const NO_READING: Reading = {
  lines: 0,
  frames: 0,
  refusedCount: 0,
  refused: [],
  delimiter: ',',
  decimal: '.',
  encoding: 'utf-8',
  headerLine: 1,
  columns: {},
  warnings: [],
};

/** Every path at which a run of the document holds null without a reason beside it. */
export function unexplainedNulls(
  node: unknown,
  path: string,
  why: Record<string, string>,
): string[] {
  if (node === null) return why[path] === undefined || why[path] === '' ? [path] : [];
  if (typeof node !== 'object') return [];
  if (Array.isArray(node)) return [];
  return Object.entries(node).flatMap(([key, value]) =>
    key === 'whyMissing' ? [] : unexplainedNulls(value, path === '' ? key : `${path}.${key}`, why),
  );
}

/** Every path at which a document holds a number that is NaN or infinite. */
export function unwritableNumbers(node: unknown, path: string): string[] {
  if (typeof node === 'number') return Number.isFinite(node) ? [] : [`${path}: ${node}`];
  if (typeof node !== 'object' || node === null) return [];
  return Object.entries(node).flatMap(([key, value]) => unwritableNumbers(value, `${path}.${key}`));
}
