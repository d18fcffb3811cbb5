import { gzipSync } from 'node:zlib';
import {
  type CsvDialect,
  type NightScenario,
  PLAIN_DIALECT,
  plateScaleArcsecPerPx,
  simulateNight,
  toCsv,
} from '@stillpier/analysis';
import {
  countClaims,
  decDriftClaim,
  ditherClaims,
  numberClaim,
  rmsClaims,
  seeingClaim,
  setAsideClaims,
  startClaim,
  textClaim,
  wormClaims,
} from './night-claims';
import { ORCHARD_PIER } from './orchard-pier';
import { ownHeaders } from './own-headers-sample';
import { withLines } from './rewrite-table';
import type { GoodSample } from './sample';
import {
  CALM,
  POLAR_DRIFT,
  STRAIN_WAVE,
  THREE_TARGETS,
  UNGUIDED,
  UNMARKED,
  WORM,
} from './sample-scenarios';
import { turnedCamera } from './turned-camera-sample';

const GUIDE_SCALE = plateScaleArcsecPerPx(3.75, 1, 200);

const NO_SKY: CsvDialect = { ...PLAIN_DIALECT, targets: false, sky: false };

/** All good samples; every draw of the simulator is fixed by a seed. */
export function goodSamples(): GoodSample[] {
  return [
    wormNight(),
    polarDrift(),
    guidePixels(),
    ownHeaders(),
    threeTargets(),
    unguided(),
    strainWave(),
    roughEdges(),
    unmarkedDithers(),
    turnedCamera(),
  ];
}

function sample(
  scenario: NightScenario,
  seed: number,
  dialect: CsvDialect,
): { night: GoodSample['night']; csv: string } {
  const night = simulateNight(scenario, seed);
  return { night, csv: toCsv(night.frames, dialect) };
}

function wormNight(): GoodSample {
  const { night, csv } = sample(WORM, 101, { ...PLAIN_DIALECT, time: 'timestamp' });
  return {
    file: 'worm-night.csv',
    shows:
      'Three hours on one target with a worm that nobody has adjusted, and a gear stage of 132.6 s beside it. Commas, ISO times, all the columns that are recognised.',
    night,
    content: csv,
    rig: {
      ...ORCHARD_PIER,
      mount: {
        ...ORCHARD_PIER.mount,
        gearStages: [{ name: 'transfer gear', periodSeconds: 132.6 }],
      },
    },
    claims: [
      startClaim(night),
      ...countClaims(night, 0),
      ...rmsClaims(night, 0),
      ...wormClaims(WORM, 0),
      seeingClaim(WORM, 0, 0.03),
    ],
  };
}

function polarDrift(): GoodSample {
  const { night, csv } = sample(POLAR_DRIFT, 102, {
    ...PLAIN_DIALECT,
    delimiter: ';',
    decimal: ',',
  });
  return {
    file: 'polar-drift.csv',
    shows:
      'Two and a half hours with a polar axis that is nine arcminutes off: the guider works against a steady Dec drift. Semicolons, decimal commas, seconds since the start.',
    night,
    content: csv,
    rig: ORCHARD_PIER,
    claims: [
      textClaim('reading.decimal', 'decimal sign', ','),
      textClaim('runs[0].start', 'start', null),
      ...countClaims(night, 0),
      ...rmsClaims(night, 0),
      decDriftClaim(night, 0),
    ],
  };
}

function guidePixels(): GoodSample {
  const dialect: CsvDialect = {
    ...NO_SKY,
    time: 'timestamp',
    guidePixelArcsec: GUIDE_SCALE,
    decimals: 4,
    state: false,
  };
  const { night, csv } = sample(CALM, 103, dialect);
  return {
    file: 'guide-pixels.csv',
    shows:
      'Two calm hours written in pixels of the guide camera: without the guide scope of the rig there would be no arcseconds.',
    night,
    content: csv,
    rig: ORCHARD_PIER,
    claims: [
      startClaim(night),
      numberClaim('optics.guideScaleArcsecPerPx', 'guide scale', '″/px', 3.8675, 0.0001),
      ...countClaims(night, 0),
      ...rmsClaims(night, 0, 0.002),
    ],
  };
}

function threeTargets(): GoodSample {
  const { night, csv } = sample(THREE_TARGETS, 105, { ...PLAIN_DIALECT, time: 'timestamp' });
  return {
    file: 'three-targets.csv',
    shows:
      'Three targets in one night on both sides of the pier, dithers every ten minutes, clouds for four minutes in the second run.',
    night,
    content: csv,
    rig: ORCHARD_PIER,
    claims: [
      startClaim(night),
      numberClaim('runs.length', 'runs', '', 3, 0),
      ...THREE_TARGETS.runs.flatMap(({ target }, run) => [
        textClaim(`runs[${run}].target`, `target of run ${run + 1}`, target),
        ...countClaims(night, run),
        ...setAsideClaims(night, run),
        ...rmsClaims(night, run),
      ]),
    ],
  };
}

function unguided(): GoodSample {
  const { night } = sample(UNGUIDED, 106, NO_SKY);
  const frames = { ...night.frames, raCorrection: null, decCorrection: null };
  const cosDeclination = Math.cos((30 * Math.PI) / 180);
  return {
    file: 'unguided-worm.csv',
    shows:
      'Two hours with the guider switched off and no corrections in the log, at declination 30°: the RA error is the worm itself.',
    night,
    content: toCsv(frames, { ...NO_SKY, time: 'timestamp', state: false }),
    rig: ORCHARD_PIER,
    claims: [
      startClaim(night),
      ...countClaims(night, 0),
      ...rmsClaims(night, 0),
      textClaim('runs[0].spectrum.ra.peaks[0].label', 'strongest line in RA', 'worm'),
      numberClaim('runs[0].spectrum.ra.peaks[0].periodSeconds', 'its period', 's', 478.69, 1),
      numberClaim(
        'runs[0].spectrum.ra.peaks[0].amplitudeArcsec',
        'its amplitude on the sky, 7.5″ · cos 30°',
        '″',
        Number((7.5 * cosDeclination).toFixed(2)),
        0.2,
      ),
    ],
  };
}

function strainWave(): GoodSample {
  const { night, csv } = sample(STRAIN_WAVE, 107, { ...NO_SKY, time: 'timestamp' });
  return {
    file: 'strain-wave.csv.gz',
    shows:
      'Three hours on a strain-wave drive with a period of 430.8 s and a frame every 1.5 s, give or take: uneven times. Compressed by gzip.',
    night,
    content: gzipSync(csv, { level: 9 }),
    rig: {
      ...ORCHARD_PIER,
      name: 'Balcony',
      mount: {
        kind: 'strain wave',
        gearStages: [{ name: 'wave generator', periodSeconds: 430.8 }],
        guideRateSidereal: 0.5,
      },
    },
    claims: [
      ...countClaims(night, 0),
      ...rmsClaims(night, 0),
      textClaim('runs[0].spectrum.ra.method', 'spectrum by', 'lomb-scargle'),
      textClaim('runs[0].spectrum.ra.peaks[0].label', 'strongest line in RA', 'wave generator'),
    ],
  };
}

function roughEdges(): GoodSample {
  const { night, csv } = sample(CALM, 108, NO_SKY);
  const content = withLines(csv, [
    [1, 'North pier, guide log of the evening'],
    [2, '# exposure 2 s, gain 20'],
    [3, ''],
    [100, '# a lorry went by'],
    [200, '398,0.1'],
    [300, '598,--,0.1,0,0,guiding'],
    [400, '12,0.1,0.1,0,0,guiding'],
    [500, 'guider restarted'],
    [501, ''],
  ]);
  const refused = (at: number, line: number, reason: string) => [
    numberClaim(`reading.refused[${at}].line`, `refused line ${at + 1}`, '', line, 0),
    textClaim(`reading.refused[${at}].reason`, 'because', reason),
  ];
  return {
    file: 'rough-edges.csv',
    shows:
      'A log with a title and comments above and between the frames, blank lines and four lines that cannot be read: they are refused, counted and listed, and the rest is analysed.',
    night,
    content,
    rig: ORCHARD_PIER,
    claims: [
      numberClaim('reading.lines', 'lines', '', content.trimEnd().split('\n').length, 0),
      numberClaim('reading.headerLine', 'header line', '', 4, 0),
      numberClaim('reading.refusedCount', 'refused lines', '', 4, 0),
      ...refused(0, 200, 'the line has 2 columns instead of 6'),
      ...refused(1, 300, 'RA error is not a number: "--"'),
      ...refused(2, 400, 'time goes back by 770 s'),
      ...refused(3, 500, 'the line has 1 column instead of 6'),
      ...countClaims(night, 0),
      ...rmsClaims(night, 0),
    ],
  };
}

function unmarkedDithers(): GoodSample {
  const dialect: CsvDialect = { ...NO_SKY, time: 'timestamp', state: false };
  const { night, csv } = sample(UNMARKED, 109, dialect);
  return {
    file: 'unmarked-dithers.csv',
    shows:
      'Two hours with a dither every quarter of an hour and no column that tells of them: they are found by their shape and set aside.',
    night,
    content: csv,
    rig: ORCHARD_PIER,
    claims: [
      startClaim(night),
      numberClaim('runs[0].frames', 'frames', '', night.frames.count, 0),
      ...ditherClaims(night, 0),
      ...rmsClaims(night, 0, 0.03),
    ],
  };
}
