import type { Claim, ExpectedSamples } from './sample';

/** `samples/README.md`: what is in each log and what must come out. */
export function samplesReadme({ ok, notOk }: ExpectedSamples): string {
  return [
    '# Sample logs',
    '',
    "Guide logs that the project's own simulator made, with fixed random starts: `npm run samples` makes them anew.",
    'Rigs, places and targets are invented. `expected.json` holds the figures below, and a test reads every log and',
    'checks them. RMS and counts are those of the simulated frames; worm, drift and seeing are those that were put in.',
    'The logs of Orchard pier whose times tell a date are of seven evenings of March 2026, so that all of them can be',
    'dropped on one rig.',
    '',
    '    npm run --silent analyse -- samples/ok/worm-night.csv --rig samples/ok/worm-night.rig.json',
    '',
    '## Good logs: `ok/`',
    ...ok.flatMap(({ file, shows, map, rig, claims }) => [
      '',
      `### \`${file}\``,
      '',
      shows,
      '',
      ...(map === null ? [] : [`To be read with \`--map ${map}\`.`, '']),
      ...(rig === null ? [] : [`To be analysed with \`--rig ${rig}\`.`, '']),
      '| what must come out | where | value |',
      '| --- | --- | --- |',
      ...claims.map((claim) => `| ${claim.says} | \`${claim.path}\` | ${value(claim)} |`),
    ]),
    '',
    '## Faulty logs: `not-ok/`',
    '',
    'None of these can be used; each ends with exit code 2 and one sentence.',
    '',
    '| file | what is in it | sentence |',
    '| --- | --- | --- |',
    ...notOk.map(({ file, shows, map, complaint }) => {
      const withMap = map === null ? '' : ` With \`--map ${map}\`.`;
      return `| \`${file}\` | ${shows}${withMap} | ${complaint} |`;
    }),
    '',
  ].join('\n');
}

function value({ value, within, unit }: Claim): string {
  if (value === null) return 'none';
  if (typeof value === 'string') return value;
  const unitText = unit === '″' || unit === '' ? unit : ` ${unit}`;
  return within === 0 ? `${value}${unitText}` : `${value}${unitText} ± ${within}`;
}
