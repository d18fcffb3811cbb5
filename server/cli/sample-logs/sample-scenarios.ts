import { type NightScenario, PLAIN_NIGHT, type RunScenario } from '@stillpier/analysis';

const HOUR = 3600;
/** Instant of 21:12 in the evening of a day of March 2026, by a clock four hours behind UTC. */
function evening(day: number): number {
  return Date.UTC(2026, 2, day + 1, 1, 12) / 1000;
}
/** One turn of a worm on a wheel of 180 teeth: sidereal day / 180. */
const WORM_180_SECONDS = 86_164.0905 / 180;

function run(change: Partial<RunScenario>): RunScenario {
  return {
    durationSeconds: 3 * HOUR,
    pauseSeconds: 0,
    target: 'Lantern Nebula',
    declinationDegrees: 41,
    hourAngleHours: -1.5,
    pierSide: 'west',
    ...change,
  };
}

const night: NightScenario = {
  ...PLAIN_NIGHT,
  startEpochSeconds: evening(14),
  latitudeDegrees: 45,
  runs: [run({})],
};

/** A worm that has not been adjusted, a gear stage beside it, seeing of half an arcsecond a frame. */
export const WORM: NightScenario = {
  ...night,
  drive: {
    ...night.drive,
    worm: {
      periodSeconds: WORM_180_SECONDS,
      harmonics: [
        { order: 1, amplitudeArcsec: 7.5, phaseDegrees: 40 },
        { order: 2, amplitudeArcsec: 1.8, phaseDegrees: 115 },
        { order: 3, amplitudeArcsec: 0.5, phaseDegrees: -70 },
      ],
    },
    lines: [{ periodSeconds: 132.6, amplitudeArcsec: 0.8, phaseDegrees: 10 }],
  },
  seeing: { whiteSigmaArcsec: 0.45, correlated: { sigmaArcsec: 0, memorySeconds: 5 } },
};

/** A polar axis that is 9 arcminutes off. */
export const POLAR_DRIFT: NightScenario = {
  ...night,
  startEpochSeconds: evening(15),
  runs: [run({ durationSeconds: 2.5 * HOUR, declinationDegrees: 12, hourAngleHours: -0.8 })],
  polar: { azimuthArcmin: 8, altitudeArcmin: -4 },
  seeing: { whiteSigmaArcsec: 0.6, correlated: { sigmaArcsec: 0, memorySeconds: 5 } },
};

/** A good mount on a night of good seeing. */
export const CALM: NightScenario = {
  ...night,
  startEpochSeconds: evening(18),
  runs: [run({ durationSeconds: 2 * HOUR, declinationDegrees: 58 })],
  drive: {
    ...night.drive,
    worm: {
      periodSeconds: WORM_180_SECONDS,
      harmonics: [{ order: 1, amplitudeArcsec: 2.5, phaseDegrees: 0 }],
    },
  },
  seeing: { whiteSigmaArcsec: 0.3, correlated: { sigmaArcsec: 0, memorySeconds: 5 } },
};

/** Before and past midnight, with a few dithers. */
export const LATE: NightScenario = {
  ...CALM,
  startEpochSeconds: Date.UTC(2026, 2, 21, 2, 55) / 1000,
  runs: [run({ durationSeconds: 2 * HOUR, declinationDegrees: 20 })],
  dithers: { everySeconds: 900, sizeArcsec: 5, settledArcsec: 1.2 },
};

/** Dithers that no column tells of: they have to be found by their shape. */
export const UNMARKED: NightScenario = {
  ...CALM,
  startEpochSeconds: evening(23),
  dithers: { everySeconds: 900, sizeArcsec: 6, settledArcsec: 1 },
};

/** A guide camera that is turned, on a night with a few dithers. */
export const TURNED: NightScenario = { ...LATE, startEpochSeconds: evening(25) };

/** Three targets on both sides of the pier, dithers, and clouds in the second run. */
export const THREE_TARGETS: NightScenario = {
  ...night,
  startEpochSeconds: evening(16),
  runs: [
    run({ target: 'Lantern Nebula', durationSeconds: 1.4 * HOUR }),
    run({
      target: 'Heron Galaxy',
      durationSeconds: 1.2 * HOUR,
      pauseSeconds: 420,
      declinationDegrees: 12,
      hourAngleHours: 0.6,
      pierSide: 'east',
    }),
    run({
      target: 'Bramble Cluster',
      durationSeconds: HOUR,
      pauseSeconds: 300,
      declinationDegrees: -4,
      hourAngleHours: -2.2,
    }),
  ],
  polar: { azimuthArcmin: 3, altitudeArcmin: 2 },
  dithers: { everySeconds: 600, sizeArcsec: 4, settledArcsec: 1.6 },
  clouds: [{ fromSeconds: 7000, toSeconds: 7240 }],
};

/** Nobody guides: the whole motion of the worm is in the log. */
export const UNGUIDED: NightScenario = {
  ...WORM,
  startEpochSeconds: evening(22),
  runs: [run({ durationSeconds: 2 * HOUR, declinationDegrees: 30 })],
  drive: { ...WORM.drive, lines: [] },
  guider: {
    ...WORM.guider,
    ra: { ...WORM.guider.ra, gain: 0 },
    dec: { ...WORM.guider.dec, gain: 0 },
  },
};

/** A strain-wave drive: a large and quick error, frames at uneven intervals. */
export const STRAIN_WAVE: NightScenario = {
  ...night,
  cadenceSeconds: 1.5,
  cadenceJitterSeconds: 0.2,
  runs: [run({ durationSeconds: 3 * HOUR, declinationDegrees: 35 })],
  drive: {
    ...night.drive,
    worm: {
      periodSeconds: 430.8,
      harmonics: [
        { order: 1, amplitudeArcsec: 18, phaseDegrees: 60 },
        { order: 2, amplitudeArcsec: 5, phaseDegrees: 200 },
      ],
    },
  },
  seeing: { whiteSigmaArcsec: 0.5, correlated: { sigmaArcsec: 0, memorySeconds: 5 } },
};
