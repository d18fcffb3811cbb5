import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Readable } from 'node:stream';
import { describe, expect, it } from 'vitest';
import { runAnalyse } from './analyse';
import type { Claim, ExpectedSamples } from './sample-logs/sample';
import { samplesReadme } from './sample-logs/samples-readme';

const SAMPLES = 'samples';
const expected = JSON.parse(
  readFileSync(join(SAMPLES, 'expected.json'), 'utf8'),
) as ExpectedSamples;

function analyse(place: string, { file, map, rig }: ExpectedSamples['ok' | 'notOk'][number]) {
  const at = (name: string) => join(SAMPLES, place, name);
  const options = [...(map ? ['--map', at(map)] : []), ...(rig ? ['--rig', at(rig)] : [])];
  return runAnalyse([at(file), ...options], Readable.from([]));
}

/** The value at a path; `setAside[dither].frames` is the sum over the stretches with that reason. */
function valueAt(document: unknown, path: string): unknown {
  const summed = /^(.*)\.setAside\[([a-z ]+)\]\.frames$/.exec(path);
  if (summed) {
    const [, run = '', reason] = summed;
    const stretches = valueAt(document, `${run}.setAside`) as { frames: number; reason: string }[];
    return stretches
      .filter((stretch) => stretch.reason === reason)
      .reduce((sum, { frames }) => sum + frames, 0);
  }
  return path
    .split(/[.[\]]+/)
    .filter((key) => key !== '')
    .reduce<unknown>((value, key) => (value as Record<string, unknown>)[key], document);
}

function holds(claim: Claim, found: unknown): boolean {
  if (typeof claim.value !== 'number' || claim.within === 0) return found === claim.value;
  return typeof found === 'number' && Math.abs(found - claim.value) <= claim.within;
}

// Expected values: the simulator's truth, as server/cli/samples wrote it into samples/expected.json.
describe('the sample logs', () => {
  it.each(expected.ok)('$file gives what its README says', async (sample) => {
    const { complaint, output } = await analyse('ok', sample);
    expect(complaint).toBeNull();
    const document: unknown = JSON.parse(output);
    const broken = sample.claims
      .map((claim) => ({ ...claim, found: valueAt(document, claim.path) }))
      .filter((claim) => !holds(claim, claim.found));
    expect(broken).toEqual([]);
  });

  it.each(expected.notOk)('$file ends with its one sentence', async (sample) => {
    const { exitCode, output, complaint } = await analyse('not-ok', sample);
    expect({ exitCode, output }).toEqual({ exitCode: 2, output: '' });
    expect(complaint?.replace(/"samples\/not-ok\//, '"')).toBe(sample.complaint);
  });

  it('are all described in the README, which is up to date', () => {
    expect(readFileSync(join(SAMPLES, 'README.md'), 'utf8')).toBe(samplesReadme(expected));
    for (const [place, samples] of [
      ['ok', expected.ok],
      ['not-ok', expected.notOk],
    ] as const) {
      const described = samples.flatMap(({ file, map, rig }) => [file, map, rig]).filter(Boolean);
      expect(readdirSync(join(SAMPLES, place)).sort()).toEqual(described.sort());
    }
  });
});
