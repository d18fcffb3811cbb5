import { readFileSync } from 'node:fs';

interface Check {
  id: string;
  topic: string;
  formula: string;
  inputs: unknown;
  expected: unknown;
  tolerance: { rel?: number; abs?: number };
  source: string;
  status: string;
}

const checks = JSON.parse(
  readFileSync(new URL('./checks.json', import.meta.url), 'utf8'),
) as Check[];

/** A check value; the spec that reads it says what its inputs and expectation look like. */
export interface Entry<Inputs, Expected> {
  readonly id: string;
  readonly inputs: Inputs;
  readonly expected: Expected;
  readonly tolerance: Check['tolerance'];
  /** Names source and status. */
  readonly title: string;
}

/** A check value by its id. */
export function check(id: string): Entry<unknown, unknown> {
  const found = checks.find((entry) => entry.id === id);
  if (!found) throw new Error(`checks.json has no entry ${id}`);
  return {
    id,
    inputs: found.inputs,
    expected: found.expected,
    tolerance: found.tolerance,
    title: `checks.json ${id}, ${found.status}: ${found.source}`,
  };
}

/** Largest difference that the entry's tolerance allows from an expected number. */
export function allowed(tolerance: Check['tolerance'], expected: number): number {
  return Math.max(tolerance.abs ?? 0, (tolerance.rel ?? 0) * Math.abs(expected));
}

/** Columns of a data file by header name. */
export function columns(file: string): Record<string, Float64Array> {
  const text = readFileSync(new URL(`./data/${file}`, import.meta.url), 'utf8');
  const [header, ...rows] = text.trim().split('\n');
  const cells = rows.map((row) => row.split(','));
  return Object.fromEntries(
    (header ?? '')
      .split(',')
      .map((name, at) => [name, Float64Array.from(cells.map((row) => Number(row[at])))]),
  );
}
