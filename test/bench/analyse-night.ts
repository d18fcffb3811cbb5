import {
  analyseLog,
  fastLombScargle,
  type LogFrames,
  type NightScenario,
  PLAIN_NIGHT,
  type Reading,
  type RigDescription,
  simulateNight,
} from '@stillpier/analysis';
import { bestOf, processorSeconds } from './processor-seconds';

// The whole analysis of a night against one Lomb-Scargle periodogram by FFT of the same length, and how both grow.
const FRAMES = 40_000;
const GROWTH = [10_000, 40_000, 160_000, 200_000, 640_000];
const TURNS = 5;
/** 40,000 frames are then a night of eleven hours. */
const CADENCE_SECONDS = 1;

const RIG: RigDescription = {
  mount: { wormPeriodSeconds: 480, guideRateSidereal: 0.5 },
  imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76 },
  guiding: { focalLengthMm: 240, apertureMm: 50, pixelUm: 3.75 },
  seeingFwhmArcsec: 2,
};
const READING: Reading = {
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

/** A night with all that makes work: worm, Dec gap, dithers, a polar error. */
function night(frames: number): LogFrames {
  const scenario: NightScenario = {
    ...PLAIN_NIGHT,
    cadenceSeconds: CADENCE_SECONDS,
    runs: PLAIN_NIGHT.runs.map((run) => ({ ...run, durationSeconds: frames * CADENCE_SECONDS })),
    drive: { ...PLAIN_NIGHT.drive, decBacklashArcsec: 2 },
    polar: { azimuthArcmin: 2, altitudeArcmin: 1 },
    dithers: { everySeconds: 300, sizeArcsec: 4, settledArcsec: 1.5 },
  };
  return simulateNight(scenario, 7).frames;
}

const analysed = (log: LogFrames) => () => analyseLog(log, READING, RIG, {});
const oneLombScargle = (log: LogFrames) => () =>
  fastLombScargle(log.timeSeconds, 0.5 / CADENCE_SECONDS).explained(log.raError);

const log = night(FRAMES);
// Both in turn, so that what the machine does meanwhile falls on both.
bestOf(2, analysed(log));
bestOf(2, oneLombScargle(log));
let [whole, one] = [Infinity, Infinity];
for (let turn = 0; turn < TURNS; turn++) {
  whole = Math.min(whole, processorSeconds(analysed(log)));
  one = Math.min(one, processorSeconds(oneLombScargle(log)));
}
console.log(
  `analyse-night: ${FRAMES} frames ${whole.toFixed(2)} s of processor (budget 1.5), ` +
    `one Lomb-Scargle ${one.toFixed(3)} s, ratio ${(whole / one).toFixed(1)} (budget 2)`,
);
for (const frames of GROWTH) {
  const long = night(frames);
  const seconds = bestOf(frames > 200_000 ? 1 : 2, analysed(long));
  const perFrame = (seconds / whole) * (FRAMES / frames);
  const budget = frames === 200_000 ? ' (budget 6)' : '';
  console.log(
    `analyse-night: ${frames} frames ${seconds.toFixed(2)} s, ${(seconds / whole).toFixed(2)} times ` +
      `${FRAMES} frames${budget}; a frame costs ${perFrame.toFixed(2)} times as much`,
  );
}
const peakMiB = Math.round(process.resourceUsage().maxRSS / 1024);
console.log(`analyse-night: peak memory ${peakMiB} MiB with ${GROWTH.at(-1) ?? 0} frames`);
