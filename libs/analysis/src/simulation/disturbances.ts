import { polarDisplacement } from '../mount/polar-drift';
import { at } from '../statistics/at';
import { type NightClock } from './night-clock';
import { type NightScenario, type RunScenario, type Wandering } from './night-scenario';
import { RandomSource } from './random-source';

/** What moves the star of one axis with no guider at work, a value a frame in arcsec on the sky. */
export interface AxisDisturbance {
  /** Mount and sky: drift, gears, wandering; starts anew in every run. */
  readonly openLoopArcsec: Float64Array;
  /** The worm's part of it. */
  readonly periodicErrorArcsec: Float64Array;
  readonly gustArcsec: Float64Array;
  /** Moves the measured star, not the mount. */
  readonly seeingArcsec: Float64Array;
}

/** All disturbances of a night. Each cause draws from its own stream: leaving one out changes no other. */
export function disturbances(scenario: NightScenario, clock: NightClock, seed: number) {
  return {
    ra: axisDisturbance(scenario, clock, seed, 'ra'),
    dec: axisDisturbance(scenario, clock, seed, 'dec'),
  };
}

function axisDisturbance(
  scenario: NightScenario,
  clock: NightClock,
  seed: number,
  axis: 'ra' | 'dec',
): AxisDisturbance {
  const { drive, seeing } = scenario;
  const count = clock.timeSeconds.length;
  const wandering = axis === 'ra' ? drive.raWandering : drive.decWandering;
  const openLoop = wander(wandering, clock, RandomSource.forCause(seed, `${axis} wandering`));
  const correlated = wander(seeing.correlated, clock, RandomSource.forCause(seed, `${axis} air`));
  const white = RandomSource.forCause(seed, `${axis} seeing`);
  const periodic = new Float64Array(count);
  const seeingArcsec = new Float64Array(count);
  let runStart = 0;
  for (let n = 0; n < count; n++) {
    const run = scenario.runs[at(clock.run, n)];
    if (run === undefined) continue;
    if (n > 0 && clock.run[n] !== clock.run[n - 1]) runStart = n;
    const time = at(clock.timeSeconds, n);
    const scale = axis === 'ra' ? Math.cos((run.declinationDegrees * Math.PI) / 180) : 1;
    if (axis === 'ra') periodic[n] = scale * wormError(drive.worm, time);
    const smooth = axis === 'ra' ? lineError(drive.lines, time) : 0;
    const drift = driftSince(scenario, run, axis, time - at(clock.timeSeconds, runStart));
    openLoop[n] = scale * (at(openLoop, n) + smooth) + at(periodic, n) + drift;
    seeingArcsec[n] = seeing.whiteSigmaArcsec * white.normal() + at(correlated, n);
  }
  const gustArcsec = gusts(scenario, clock, RandomSource.forCause(seed, `${axis} gusts`));
  return { openLoopArcsec: openLoop, periodicErrorArcsec: periodic, gustArcsec, seeingArcsec };
}

function wormError(worm: NightScenario['drive']['worm'], time: number): number {
  return lineError(
    worm.harmonics.map(({ order, amplitudeArcsec, phaseDegrees }) => ({
      periodSeconds: worm.periodSeconds / order,
      amplitudeArcsec,
      phaseDegrees,
    })),
    time,
  );
}

function lineError(lines: NightScenario['drive']['lines'], time: number): number {
  let sum = 0;
  for (const { periodSeconds, amplitudeArcsec, phaseDegrees } of lines) {
    const angle = 2 * Math.PI * (time / periodSeconds + phaseDegrees / 360);
    sum += amplitudeArcsec * Math.cos(angle);
  }
  return sum;
}

function driftSince(
  scenario: NightScenario,
  run: RunScenario,
  axis: 'ra' | 'dec',
  seconds: number,
): number {
  const { latitudeDegrees, polar: axisError } = scenario;
  const azimuthKnobArcmin = axisError.azimuthArcmin / Math.cos((latitudeDegrees * Math.PI) / 180);
  const polar = polarDisplacement(
    { azimuthKnobArcmin, altitudeArcmin: axisError.altitudeArcmin },
    { latitudeDegrees, ...run },
    seconds,
  );
  return axis === 'ra'
    ? polar.eastArcsec + (scenario.drive.raDriftArcsecPerMinute * seconds) / 60
    : polar.northArcsec + (scenario.drive.decDriftArcsecPerMinute * seconds) / 60;
}

/** A stationary AR(1) process on the frames' own times. */
function wander(wandering: Wandering, clock: NightClock, random: RandomSource): Float64Array {
  const { sigmaArcsec, memorySeconds } = wandering;
  const positions = new Float64Array(clock.timeSeconds.length);
  let position = sigmaArcsec * random.normal();
  for (let n = 0; n < positions.length; n++) {
    const step = n === 0 ? 0 : at(clock.timeSeconds, n) - at(clock.timeSeconds, n - 1);
    const kept = Math.exp(-step / memorySeconds);
    position = kept * position + sigmaArcsec * Math.sqrt(1 - kept * kept) * random.normal();
    positions[n] = position;
  }
  return positions;
}

function gusts(scenario: NightScenario, clock: NightClock, random: RandomSource): Float64Array {
  const { perHour, sizeArcsec, fadeSeconds } = scenario.gusts;
  const positions = new Float64Array(clock.timeSeconds.length);
  let position = 0;
  for (let n = 1; n < positions.length; n++) {
    const step = at(clock.timeSeconds, n) - at(clock.timeSeconds, n - 1);
    position *= Math.exp(-step / fadeSeconds);
    const [strikes, size] = [random.uniform(), random.normal()];
    if (strikes < (perHour * step) / 3600) position += sizeArcsec * size;
    positions[n] = position;
  }
  return positions;
}
