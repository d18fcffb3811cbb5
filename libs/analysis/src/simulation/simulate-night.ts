import { type LogFrames, PIER_SIDES } from '../series/log-frames';
import { at } from '../statistics/at';
import { type AxisDisturbance, disturbances } from './disturbances';
import { Dithering, stateCode } from './dithering';
import { GuidedAxis } from './guided-axis';
import { nightClock } from './night-clock';
import { type NightScenario, type RunScenario } from './night-scenario';

/** The truth about one axis, a value a frame in arcsec on the sky. */
export interface AxisTruth extends AxisDisturbance {
  /** Displacement that all corrections before the frame have caused. */
  readonly movedArcsec: Float64Array;
  readonly lockArcsec: Float64Array;
  /** Where the star really stood from its lock position: the measured error without seeing. */
  readonly pointingArcsec: Float64Array;
  /** One a run: what a pulse really does, arcsec per second. */
  readonly response: readonly { readonly positive: number; readonly negative: number }[];
}

export interface SimulatedNight {
  readonly frames: LogFrames;
  readonly truth: { readonly ra: AxisTruth; readonly dec: AxisTruth };
}

/**
 * A whole guided night from physics, with its truth. In every frame n the star is measured,
 *
 *     error[n] = openLoop[n] + gust[n] + moved[n] − lock[n] + seeing[n],
 *
 * and the correction that answers it has moved the star before frame n + 1. O(frames).
 *
 * @param seed Fixes every draw; each cause has its own stream, so two nights of one seed differ only by what their
 *   scenarios change.
 */
export function simulateNight(scenario: NightScenario, seed: number): SimulatedNight {
  const clock = nightClock(scenario, seed);
  const count = clock.timeSeconds.length;
  const disturbed = disturbances(scenario, clock, seed);
  const axes = {
    ra: new SimulatedAxis(disturbed.ra, new GuidedAxis(scenario.guider.ra, scenario.guider, 0)),
    dec: new SimulatedAxis(
      disturbed.dec,
      new GuidedAxis(scenario.guider.dec, scenario.guider, scenario.drive.decBacklashArcsec),
    ),
  };
  const dithering = new Dithering(scenario, seed);
  const state = new Uint8Array(count);
  const sky = skyColumns(scenario, count);
  let runStart = 0;
  scenario.runs.forEach((run, index) => {
    const cosDeclination = Math.cos((run.declinationDegrees * Math.PI) / 180);
    axes.ra.startRun(cosDeclination);
    axes.dec.startRun(1);
    let n = runStart;
    for (; n < count && clock.run[n] === index; n++) {
      const seconds = at(clock.timeSeconds, n) - at(clock.timeSeconds, runStart);
      writeSky(sky, n, run, seconds);
      const move = dithering.moveBefore(seconds);
      axes.ra.measure(n, move.ra);
      axes.dec.measure(n, move.dec);
      if (isCloudy(scenario, at(clock.timeSeconds, n))) {
        state[n] = stateCode('star lost');
        axes.ra.lose(n);
        axes.dec.lose(n);
      } else {
        state[n] = dithering.stateOf(at(axes.ra.error, n), at(axes.dec.error, n));
        axes.ra.correct(n);
        axes.dec.correct(n);
      }
    }
    runStart = n;
  });
  return {
    frames: {
      count,
      timeSeconds: clock.timeSeconds,
      startEpochSeconds: scenario.startEpochSeconds,
      raError: axes.ra.error,
      decError: axes.dec.error,
      errorUnit: 'arcsec',
      raCorrection: axes.ra.correction,
      decCorrection: axes.dec.correction,
      correctionUnit: scenario.guider.correctionUnit,
      correctionSign: null,
      snr: null,
      brightness: null,
      state,
      run: clock.run,
      runNames: scenario.runs.map((_, index) => String(index + 1)),
      target: clock.run,
      targetNames: scenario.runs.map((run) => run.target),
      ...sky,
    },
    truth: { ra: axes.ra.truth(), dec: axes.dec.truth() },
  };
}

function skyColumns(scenario: NightScenario, count: number) {
  return {
    declinationDegrees: new Float64Array(count),
    hourAngleHours: new Float64Array(count),
    pierSide: new Uint8Array(count),
  };
}

function writeSky(
  sky: ReturnType<typeof skyColumns>,
  n: number,
  run: RunScenario,
  seconds: number,
): void {
  sky.declinationDegrees[n] = run.declinationDegrees;
  sky.hourAngleHours[n] = run.hourAngleHours + (seconds / 3600) * 1.0027379;
  sky.pierSide[n] = PIER_SIDES.indexOf(run.pierSide);
}

function isCloudy(scenario: NightScenario, time: number): boolean {
  return scenario.clouds.some(
    ({ fromSeconds, toSeconds }) => time >= fromSeconds && time < toSeconds,
  );
}

class SimulatedAxis {
  readonly error: Float64Array;
  readonly correction: Float64Array;
  private readonly moved: Float64Array;
  private readonly lock: Float64Array;
  private readonly pointing: Float64Array;
  private readonly response: { positive: number; negative: number }[] = [];
  private lockNow = 0;
  private centreNext = false;

  constructor(
    private readonly disturbance: AxisDisturbance,
    private readonly guided: GuidedAxis,
  ) {
    const count = disturbance.openLoopArcsec.length;
    this.error = new Float64Array(count);
    this.correction = new Float64Array(count);
    this.moved = new Float64Array(count);
    this.lock = new Float64Array(count);
    this.pointing = new Float64Array(count);
  }

  /** The guider takes the star where it stands as its lock position. */
  startRun(skyPerAxisAngle: number): void {
    this.guided.point(skyPerAxisAngle);
    this.response.push({
      positive: this.guided.responseArcsecPerSecond('positive'),
      negative: this.guided.responseArcsecPerSecond('negative'),
    });
    this.centreNext = true;
  }

  measure(n: number, lockMove: number): void {
    const { openLoopArcsec, gustArcsec, seeingArcsec } = this.disturbance;
    const star = at(openLoopArcsec, n) + at(gustArcsec, n) + this.guided.movedArcsec;
    this.lockNow = this.centreNext ? star : this.lockNow + lockMove;
    this.centreNext = false;
    this.moved[n] = this.guided.movedArcsec;
    this.lock[n] = this.lockNow;
    this.pointing[n] = star - this.lockNow;
    this.error[n] = star - this.lockNow + at(seeingArcsec, n);
  }

  lose(n: number): void {
    this.error[n] = NaN;
  }

  correct(n: number): void {
    this.correction[n] = this.guided.answer(at(this.error, n));
  }

  truth(): AxisTruth {
    return {
      ...this.disturbance,
      movedArcsec: this.moved,
      lockArcsec: this.lock,
      pointingArcsec: this.pointing,
      response: this.response,
    };
  }
}
