import {
  type Loop,
  type PeriodicError,
  type Response,
  type Uncorrected,
} from '../analysis-document';
import { type PlayFit } from './backlash';

/** Response that the uncorrected motion rests on, in arcsec on the sky per unit of correction; magnitudes. */
export interface UsedResponse {
  readonly positivePerUnit: number;
  readonly negativePerUnit: number;
  /** Relative; 0 when the rig's guide rate is taken as it is. */
  readonly relativeStandardError: number;
  readonly from: 'rig' | 'log';
}

/** A sine in the uncorrected motion of one axis: amplitude · cos(2π t / period + phase), t from the run's first frame. */
export interface MotionLine {
  readonly periodSeconds: number;
  /** On the sky. */
  readonly amplitudeArcsec: number;
  readonly phaseRadians: number;
}

/** One axis taken apart; arrays have one value a frame of the run. Null where the log does not tell. */
export interface AxisMotion {
  /** +1: a logged correction of +1 moves the star towards +error; −1: towards −error. */
  readonly sign: 1 | -1 | null;
  readonly signFrom: 'map' | 'log' | null;
  readonly responseUsed: UsedResponse | null;
  /** What the correction of frame n commands for the motion from n to n + 1, towards +error positive. */
  readonly commandArcsec: Float64Array | null;
  /** What it causes: the command, in Dec behind the gap of the gears where one is determined. */
  readonly displacementArcsec: Float64Array | null;
  /**
   * e[n] less all displacements before n, with dither jumps taken out; NaN where no star was measured.
   * Starts near zero, its level is free.
   */
  readonly uncorrectedArcsec: Float64Array | null;
  /** Drift, periodic error and other significant lines fitted to `uncorrectedArcsec`, at every frame. */
  readonly smoothArcsec: Float64Array | null;
  /** The drift's part of it, which bends on a long run. */
  readonly driftArcsec: Float64Array | null;
  /** RA only: the periodic error's part of `smoothArcsec`, on the sky; zeros where there is none. */
  readonly periodicErrorArcsec: Float64Array | null;
  /** All significant lines, the worm's harmonics among them, strongest first. */
  readonly lines: readonly MotionLine[];
  /** White noise of one frame (the seeing floor) and standard deviation of the drive's random step a frame. */
  readonly noiseArcsec: number | null;
  readonly stepArcsec: number | null;
}

/** An axis of which the log tells nothing. */
export const NO_MOTION: AxisMotion = {
  sign: null,
  signFrom: null,
  responseUsed: null,
  commandArcsec: null,
  displacementArcsec: null,
  uncorrectedArcsec: null,
  smoothArcsec: null,
  driftArcsec: null,
  periodicErrorArcsec: null,
  lines: [],
  noiseArcsec: null,
  stepArcsec: null,
};

/** Everything that the corrections tell of the mount in one run: the parts of the document, and what they rest on. */
export interface MountMotion {
  readonly response: { ra: Response; dec: Response } | null;
  readonly uncorrected: { ra: Uncorrected; dec: Uncorrected } | null;
  readonly periodicError: PeriodicError | null;
  readonly loop: { ra: Loop | null; dec: Loop | null };
  readonly seeingFloor: { raArcsec: number | null; decArcsec: number | null } | null;
  /** Keys of the run that are null, dotted for nested ones: `periodicError`, `response.ra.asymmetry`. */
  readonly whyMissing: Record<string, string>;
  readonly ra: AxisMotion;
  readonly dec: AxisMotion;
  /** The Dec gap, from `fitBacklash` on the Dec commands; or why there is none. */
  readonly decPlay: PlayFit | { readonly why: string };
}
