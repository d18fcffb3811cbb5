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
    ...COLUMN_MAPS,
  ].join('\n');
}

const COLUMN_MAPS = [
  '## Column maps',
  '',
  'A column map says what a log does not say of itself; every key may be left out. `own-headers.map.json` and',
  '`turned-camera.map.json` are two.',
  '',
  '| key | what it says |',
  '| --- | --- |',
  '| `delimiter`, `decimal`, `headerLine`, `comment` | how the file is written; `headerLine` 0 says that it has no header |',
  '| `columns` | by header text or number from 1: `role`, `unit` and `sentinels` of a column |',
  '| `sentinels` of a column | cells that mean "no value", as a blank or NaN does without being named: `["-1", "n/a"]`. Nothing else is taken for one |',
  '| `states` | by text in the state column: guiding, dither, settling, star lost or ignore |',
  '| `correctionSign` | whether a correction of +1 moves the star towards +error (`same`) or not (`opposite`) |',
  '| `dateOrder` | `day-month-year` or `month-day-year`, for dates whose year stands last; it must be given where both can be read |',
  '| `cameraAngleDegrees` | for the roles `xError` and `yError`: the angle from growing x to growing RA error (east), turning towards growing y. Growing Dec error (north) lies a quarter turn further on: RA = x cos θ + y sin θ, Dec = y cos θ - x sin θ. With x to the right and y downwards in a picture that is not mirrored, north up has 180° |',
  '| `cameraMirrored` | Dec lies a quarter turn back instead: its sign changes |',
  '| `targetDeclinationDegrees`, `targetHourAngleHours` | where the log pointed, the hour angle at its first frame |',
  '| `startTime` | the instant of the first frame, where the times tell no date |',
  '',
  'A column with the role `date` and one with the role `time` and the unit `clock` are read together. A log of several runs',
  'may have a header above each: the columns may change places, but time and errors must be there in the units of the first.',
  '',
];

function value({ value, within, unit }: Claim): string {
  if (value === null) return 'none';
  if (typeof value === 'string') return value;
  const unitText = unit === '″' || unit === '' ? unit : ` ${unit}`;
  return within === 0 ? `${value}${unitText}` : `${value}${unitText} ± ${within}`;
}
