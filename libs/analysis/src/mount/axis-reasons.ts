import { type Loop, type Response, type Uncorrected } from '../analysis-document';
import { type CorrectionSign } from './correction-sign';
import { secondDifferenceNoise } from './seeing-floor';
import { type LevelFrames } from './whitened-least-squares';

/** What an axis' sentences depend on. */
export interface AxisFacts {
  readonly axis: 'ra' | 'dec';
  /** Null: the log has no such column. */
  readonly correction: Float64Array | null;
  readonly correctionUnit: 'ms' | 'arcsec';
  readonly sign: CorrectionSign | null;
  readonly guideRateSidereal: number | undefined;
  readonly frames: LevelFrames;
  readonly errorArcsec: Float64Array;
}

export interface AxisParts {
  readonly response: Response;
  readonly uncorrected: Uncorrected | null;
  readonly loop: Loop;
  readonly floorArcsec: number | null;
  /** Whether the log told a response at all. */
  readonly isResponseTold: boolean;
}

/** A sentence for every null among an axis' parts, under its dotted key in the run; `uncorrected` for the part itself. */
export function axisReasons(facts: AxisFacts, parts: AxisParts): Record<string, string> {
  const { axis } = facts;
  const why: Record<string, string> = {};
  const motion = motionReason(facts, parts.isResponseTold);
  for (const [key, value] of Object.entries(parts.response)) {
    if (value !== null) continue;
    why[`response.${axis}.${key}`] =
      key === 'expectedArcsecPerSecond'
        ? expectedReason(facts)
        : responseReason(facts, parts.isResponseTold);
  }
  for (const [key, value] of Object.entries(parts.loop)) {
    if (value === null) why[`loop.${axis}.${key}`] = loopReason(key, facts, parts, motion);
  }
  if (parts.floorArcsec === null) {
    why[`seeingFloor.${axis}Arcsec`] = boundSentence(facts.errorArcsec, facts.frames);
  }
  if (parts.uncorrected === null) why['uncorrected'] = motion;
  return why;
}

/** A guided error whose corrections are not known gives an upper bound only: at gain 0.7 it reads 45 % too high. */
export function boundSentence(errorArcsec: Float64Array, frames: LevelFrames): string {
  const bound = secondDifferenceNoise(errorArcsec, frames);
  if (bound === null) return 'Too few neighbouring frames to tell the seeing floor.';
  return `Without known corrections only an upper bound can be told: at most ${bound.toFixed(2)} arcsec.`;
}

/** Why the uncorrected motion of an axis is not known. */
export function motionReason(facts: AxisFacts, isResponseTold: boolean): string {
  const name = nameOf(facts);
  if (facts.correction === null) return `The log has no ${name} corrections.`;
  if (facts.sign === null) return signReason(facts);
  if (isResponseTold) return `No frame with a ${name} error counts in this run.`;
  const rig =
    facts.guideRateSidereal === undefined
      ? 'the rig tells no guide rate'
      : 'the declination is not known';
  return `The log does not tell the ${name} response within 20 %, and ${rig}.`;
}

function responseReason(facts: AxisFacts, isTold: boolean): string {
  const { correction } = facts;
  const name = nameOf(facts);
  if (correction?.every((given) => given === 0) ?? true) {
    return `The log has no ${name} corrections other than zero.`;
  }
  if (facts.sign === null) return signReason(facts);
  if (!isTold) return `The corrections of this run do not tell the ${name} response within 20 %.`;
  if (facts.correctionUnit === 'arcsec') return arcsecReason();
  return `Nearly all ${name} corrections went the same way.`;
}

function expectedReason(facts: AxisFacts): string {
  if (facts.correctionUnit === 'arcsec') return arcsecReason();
  return facts.guideRateSidereal === undefined
    ? 'The rig tells no guide rate.'
    : 'The declination is not known.';
}

function loopReason(key: string, facts: AxisFacts, parts: AxisParts, motion: string): string {
  if (key === 'lag1') return 'Too few neighbouring frames count, or the error never changes.';
  if (parts.uncorrected === null) return motion;
  if (key === 'noiseGain' && parts.loop.gain !== null) {
    return 'A loop with a gain of 2 or more is not stable.';
  }
  return `Too few ${nameOf(facts)} corrections answer an error freely, neither zero nor cut at a maximum.`;
}

function signReason(facts: AxisFacts): string {
  return `The log does not tell clearly whether a ${nameOf(facts)} correction of +1 moves the star towards +error, and no column map says so.`;
}

function arcsecReason(): string {
  return 'Corrections are logged in arcsec: a response per second of correction cannot be told.';
}

function nameOf({ axis }: AxisFacts): string {
  return axis === 'ra' ? 'RA' : 'Dec';
}
