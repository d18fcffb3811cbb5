import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const LONGEST: [folder: string, lines: number][] = [
  ['libs', 250],
  ['server', 300],
  ['migrations', 250],
  ['apps', 300],
  ['test', 400],
];
const LONGEST_SPEC = 400;

/** Files that are one whole and would read worse in two. The list only shrinks. */
const EXCUSED = new Set([
  'libs/analysis/src/analysis-document.ts',
  'libs/contract/src/analysis-document.ts',
  'server/local/cluster.mjs',
]);

const sources = LONGEST.flatMap(([folder, limit]) =>
  readdirSync(folder, { recursive: true, encoding: 'utf8' })
    .filter((file) => /\.(ts|mjs|scss)$/.test(file))
    .map((file) => ({ file: join(folder, file), limit })),
).map(({ file, limit }) => ({ file, limit, text: readFileSync(file, 'utf8') }));

const withoutComments = (text: string) => text.replace(/^\s*(\/\*\*|\*|\/\/).*$/gm, '');

const offenders = (pattern: RegExp, read = (text: string) => text) =>
  sources
    .filter(({ file, text }) => !file.startsWith('test/rules/') && pattern.test(read(text)))
    .map(({ file }) => file);

describe('the source files', () => {
  it('are short enough to find the way in', () => {
    const long = sources
      .filter(({ file }) => !EXCUSED.has(file))
      .filter(({ file, limit, text }) => {
        const most = file.endsWith('.spec.ts') ? LONGEST_SPEC : limit;
        return text.split('\n').length > most;
      })
      .map(({ file, text }) => `${file}: ${text.split('\n').length} lines`);
    expect(long).toEqual([]);
  });

  it('silence neither types nor lint', () => {
    expect(offenders(/@ts-(ignore|nocheck)|eslint-disable/)).toEqual([]);
    expect(offenders(/\bas any\b|: any\b|<any>/, withoutComments)).toEqual([]);
  });

  it('hold no skipped or focused test and nothing left for later', () => {
    expect(offenders(/\b(it|test|describe)\.(skip|only|todo)\(|\b(TODO|FIXME|XXX)\b/)).toEqual([]);
  });
});
