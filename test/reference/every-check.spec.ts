import { readdirSync, readFileSync } from 'node:fs';
import { expect, it } from 'vitest';

const here = new URL('./', import.meta.url);
const library = new URL('../../libs/analysis/src/', import.meta.url);
const specs = [here, library]
  .flatMap((folder) =>
    readdirSync(folder, { encoding: 'utf8', recursive: true })
      .filter((file) => file.endsWith('.spec.ts') && file !== 'every-check.spec.ts')
      .map((file) => readFileSync(new URL(file, folder), 'utf8')),
  )
  .join('\n');
const ids = (
  JSON.parse(readFileSync(new URL('checks.json', here), 'utf8')) as { id: string }[]
).map(({ id }) => id);

/** Ids stand in quotes, or a template makes them of a number and a name: `9.1.${set}` of 'lew'. */
function isTested(id: string): boolean {
  if (specs.includes(`'${id}'`)) return true;
  const [, start, name] = /^(\d+\.\d+)\.(.+)$/.exec(id) ?? [];
  return specs.includes('`' + `${start}.` + '${') && specs.includes(`'${name}'`);
}

/** What the table in DEVELOPERS.md says concerns nothing here: ids, or `5.1*` for all that begin so. */
const listed = (() => {
  const text = readFileSync(new URL('../../DEVELOPERS.md', here), 'utf8');
  const section = text.split('## Check values that concern nothing here')[1]?.split('\n## ')[0];
  return [...(section ?? '').matchAll(/`([\d.]+[\w.=]*\*?)`/g)].map(([, id]) => id ?? '');
})();
const covers = (entry: string, id: string) =>
  entry.endsWith('*') ? id.startsWith(entry.slice(0, -1)) : entry === id;

it('every check value is tested, or listed in DEVELOPERS.md with the reason', () => {
  const missing = ids.filter((id) => !isTested(id) && !listed.some((entry) => covers(entry, id)));
  expect(missing).toEqual([]);
});

it('nothing is listed that is tested after all, or that is no check value', () => {
  const wrong = listed.filter((entry) => {
    const covered = ids.filter((id) => covers(entry, id));
    return covered.length === 0 || covered.some(isTested);
  });
  expect(wrong).toEqual([]);
});
