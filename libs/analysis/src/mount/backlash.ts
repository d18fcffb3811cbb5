import { type Backlash } from '../analysis-document';
import { at } from '../statistics/at';
import { ColourFilter } from './colour-filter';
import { LevelWhitening } from './level-whitening';
import { likeliestWalk } from './likeliest-walk';
import { summedBefore } from './motion-frames';
import { playInto } from './play';
import { playStart, wayOf } from './play-start';
import {
  colourOf,
  dropBumps,
  PlayProfile,
  type ProfileInput,
  type ProfilePoint,
  trendColumns,
} from './play-profile';

export interface BacklashInput {
  readonly timeSeconds: Float64Array;
  readonly cadenceSeconds: number;
  /** On the sky; NaN where no star was measured. */
  readonly errorArcsec: Float64Array;
  /** Displacement of the star that the correction of each frame commands, were there no gap; 0 for none. */
  readonly commandArcsec: Float64Array;
  /** First frames at a new lock position. */
  readonly ditherFrames: readonly number[];
  /** Of the corrections behind `commandArcsec`; null when they are logged in arcsec. */
  readonly commandArcsecPerMs: number | null;
  /**
   * How well the response behind `commandArcsec` is known, as a part of it: what the log alone tells of it leans on
   * the gap, so a guide rate that is known holds the fit.
   */
  readonly responsePrior: number;
}

export interface PlayFit extends Backlash {
  /** The gap on the scale of the command: what `playInto` needs on the summed commands. */
  readonly commandWidthArcsec: number;
  /** Motion of the star per commanded arcsec once the gap is taken up. */
  readonly responseFactor: number;
}

export const FEWEST_REVERSALS = 3;

/** Twice the log likelihood that a width may lose inside the 95 % interval: χ² of one degree of freedom. */
const INTERVAL_LOSS = 3.841;
/**
 * Loss that no gap at all must show before a gap counts as seen. More than the interval's, since the width is the best of
 * a whole scan: on nights without a gap the best one beats none by 3.8 far more often than in 5 of 100.
 */
const SEEN_LOSS = 9;
/** Standard errors by which the star must follow the commands before a gap in them can be looked for. */
const CLEAR_RESPONSE = 3;
/** Enough for a rough width; all frames tell the exact one. */
const FIRST_SCAN_FRAMES = 4096;
const REFINEMENTS = 2;
const REFINED_POINTS = 16;
const NORMAL_95 = 1.96;
/**
 * A gap under this part of one frame's noise is not claimed: seeing that is correlated from frame to frame looks like one
 * of a quarter (simulated nights with a memory of two frames).
 */
const SMALLEST_NOISE_PART = 0.4;

/**
 * Dec backlash: the width of a play operator between the summed commands and the star. For every width of a scan over
 * the whole range of the commands the response and a drift are fitted by generalised least squares on a wandering level
 * (`LevelWhitening`); the profile of the sum of squares gives the width and its 95 % interval. One scan is O(n).
 *
 * Below two standard errors, or when no gap explains the night nearly as well, the width is a limit: `determined`
 * is false and `high` is what the gap stays under.
 *
 * @returns The fit, or why there is none.
 */
export function fitBacklash(input: BacklashInput): PlayFit | { readonly why: string } {
  const reversals = reversalsOf(input.commandArcsec);
  if (reversals < FEWEST_REVERSALS) {
    return {
      why: `Dec corrections changed direction ${reversals} times in this run: backlash needs at least ${FEWEST_REVERSALS}.`,
    };
  }
  const profile = scannedProfile(input);
  const best = profile.best();
  if (!(best.squares > 0) || !(best.response > CLEAR_RESPONSE * best.responseError)) {
    return { why: 'The star does not follow the Dec corrections clearly enough to tell a gap.' };
  }
  return described(input, profile, best, reversals);
}

/**
 * Which width explains the night: a rough start and a scan on the first frames, then the scan of all, each with the wandering of
 * the level, the bumps and the colour of the noise at the width found before it.
 */
function scannedProfile(input: BacklashInput): PlayProfile {
  const part = firstFrames(input);
  const trend = trendColumns(part.timeSeconds);
  const start = playStart(framesOf(part), trend, part.errorArcsec, driverOf(part));
  const first = profileAt(part, start, () => null);
  first.scan();
  // Where the star stood inside the gap at first shows in the first frames, wherever the driver crosses the gap in them.
  const crossed = wayOf(driverOf(part));
  const lagOf = (width: number) => (width < crossed ? first.fit(width).lag : null);
  const profile = profileAt(input, first.best().width, lagOf);
  profile.scan();
  for (let round = 0; round < REFINEMENTS; round++) refine(profile);
  return profile;
}

function firstFrames(input: BacklashInput): BacklashInput {
  return {
    ...input,
    timeSeconds: input.timeSeconds.subarray(0, FIRST_SCAN_FRAMES),
    errorArcsec: input.errorArcsec.subarray(0, FIRST_SCAN_FRAMES),
    commandArcsec: input.commandArcsec.subarray(0, FIRST_SCAN_FRAMES),
    ditherFrames: input.ditherFrames.filter((frame) => frame < FIRST_SCAN_FRAMES),
  };
}

/** An empty profile whose noise model is that of one width. */
function profileAt(input: BacklashInput, width: number, lagOf: ProfileInput['lagOf']): PlayProfile {
  const frames = framesOf(input);
  const driver = driverOf(input);
  const trend = trendColumns(input.timeSeconds);
  const { errorArcsec, responsePrior } = input;
  const driven = playInto(driver, width, width / 2, new Float64Array(driver.length));
  // With the response free here, 'a still level and corrections that do nothing' would be an optimum too.
  const unfollowed = errorArcsec.map((error, n) => error - at(driven, n));
  const whitening = () =>
    new LevelWhitening({ ...frames, walkPerSecond: likeliestWalk(frames, trend, unfollowed) });
  const given = { trend, errorArcsec, driver, responsePrior, lagOf };
  const plain = new PlayProfile({ ...given, whitening: whitening(), colour: ColourFilter.none() });
  dropBumps(plain.residual(plain.fit(width)), frames.used);
  const steady = { ...given, whitening: whitening() };
  const uncoloured = new PlayProfile({ ...steady, colour: ColourFilter.none() });
  return new PlayProfile({
    ...steady,
    colour: colourOf(uncoloured.residual(uncoloured.fit(width))),
  });
}

function framesOf({ timeSeconds, cadenceSeconds, errorArcsec, ditherFrames }: BacklashInput) {
  const used = Uint8Array.from(errorArcsec, (error) => (Number.isFinite(error) ? 1 : 0));
  return { timeSeconds, cadenceSeconds, used, restartFrames: ditherFrames };
}

function driverOf(input: BacklashInput): Float64Array {
  return summedBefore(input.commandArcsec);
}

/** More points between those that frame the interval. */
function refine(profile: PlayProfile): void {
  const { points } = profile;
  const best = profile.best();
  const inside = points.filter((point) => profile.loss(point, best) <= INTERVAL_LOSS);
  const first = points.indexOf(inside[0] ?? best);
  const last = points.indexOf(inside.at(-1) ?? best);
  const from = points[Math.max(0, first - 1)]?.width ?? best.width;
  const to = points[Math.min(points.length - 1, last + 1)]?.width ?? best.width;
  profile.add(from, to, REFINED_POINTS);
}

function described(
  input: BacklashInput,
  profile: PlayProfile,
  best: ProfilePoint,
  reversals: number,
): PlayFit {
  const { points } = profile;
  const inside = points.filter((point) => profile.loss(point, best) <= INTERVAL_LOSS);
  const arcsec = best.width * best.response;
  const least = Math.min(...inside.map((point) => point.width * point.response));
  const most = Math.max(...inside.map((point) => point.width * point.response));
  // The profile holds the width uncertain at the best response; the response's own error comes in quadrature.
  const byResponse = NORMAL_95 * best.responseError * best.width;
  const low = Math.max(0, arcsec - Math.hypot(arcsec - least, byResponse));
  const high = arcsec + Math.hypot(most - arcsec, byResponse);
  const none = points[0];
  const seen = none !== undefined && profile.loss(none, best) > SEEN_LOSS;
  const standardError = (high - low) / (2 * NORMAL_95);
  const noise = profile.noise(best);
  return {
    arcsec,
    ms: input.commandArcsecPerMs === null ? null : best.width / input.commandArcsecPerMs,
    low,
    high,
    determined: seen && arcsec > Math.max(2 * standardError, SMALLEST_NOISE_PART * noise),
    reversals,
    commandWidthArcsec: best.width,
    responseFactor: best.response,
  };
}

/** How often the commands change their direction, commands of nothing left out. */
export function reversalsOf(commands: Float64Array): number {
  let reversals = 0;
  let direction = 0;
  for (const command of commands) {
    if (command === 0) continue;
    const now = Math.sign(command);
    if (direction !== 0 && now !== direction) reversals++;
    direction = now;
  }
  return reversals;
}
