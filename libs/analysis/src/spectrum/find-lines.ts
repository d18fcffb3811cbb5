import { at } from '../statistics/at';
import { localFalseAlarmProbability } from './false-alarm';
import { type LocalNoise, type NoiseLevel, noiseLevel } from './noise-level';
import { type Periodogram } from './periodogram';
import { addSine, amplitudeOf, type Circle, type SharpLine, sharpenLine } from './sharpen-line';

/** A line that stands above the noise around it. */
export interface FoundLine {
  readonly periodSeconds: number;
  /** Half the peak-to-peak, in the unit of the values. */
  readonly amplitude: number;
  readonly falseAlarmProbability: number;
}

export const LARGEST_FALSE_ALARM = 0.001;
export const MOST_LINES = 12;
/** A line must turn at least so often in the run: slower motion cannot be told from drift. */
const FEWEST_TURNS = 2;
/** Strong lines hide weak ones: search, take off what was found, search again, at most so often. */
const ROUNDS = 8;
/** Lines found are fitted beside each other at most so often, */
const SWEEPS = 12;
/** or until none changes by more than this part of its amplitude or of a resolution width. */
const AT_REST = 1e-4;
/** A line between two bins looks weaker on the grid than it is, by less than this in power. */
const BETWEEN_BINS = 1.25;
/** Under so many times the noise level nothing is a line, however few the chances. */
const FEWEST_LEVELS = 5;
/** Below this part of the highest power there is only the rounding of the arithmetic. */
const ROUNDING = 1e-12;

/**
 * The lines in a series: local maxima of its spectrum whose false-alarm probability against the noise around them is
 * below 0.001, one per resolution width, at most 12, strongest first. Lines found are fitted on the exact times, each
 * with its frequency free while the others are held, taken off, and the rest is searched again. O(n log n).
 *
 * @param values n values at the periodogram's times.
 * @param timeSeconds The times that the periodogram was built for.
 * @param squaredAmplitudes `spectrum.squaredAmplitudes(values)`.
 */
export function findLines(
  spectrum: Periodogram,
  timeSeconds: Float64Array,
  values: Float64Array,
  squaredAmplitudes: Float64Array,
): FoundLine[] {
  let lines: SharpLine[] = [];
  const left = values.slice();
  const circle = {
    cosines: new Float64Array(left.length),
    sines: new Float64Array(left.length),
  };
  let power = squaredAmplitudes;
  const floor = ROUNDING * power.reduce((most, value) => Math.max(most, value), 0);
  let noise = noiseLevel(power, firstBin(spectrum), spectrum.stride, floor);
  for (let round = 0; round < ROUNDS; round++) {
    const certain = candidates(spectrum, power, noise, lines);
    // A strong line of few turns raises the noise around itself: the highest maximum is tried all the same, and held
    // against what is left without it.
    const tried = certain.length === 0;
    const fresh = tried ? highestMaximum(spectrum, power, noise) : certain;
    if (fresh.length === 0 || lines.length >= MOST_LINES) break;
    const before = lines.slice();
    for (const frequency of fresh) {
      const line = sharpenLine(timeSeconds, left, frequency, spectrum.resolutionHz / 2, circle);
      addSine(left, timeSeconds, line, -1, circle);
      lines.push(line);
    }
    // What a first guess leaves beside a strong line must not pass for another.
    sharpenTogether(spectrum, timeSeconds, left, lines, circle);
    power = spectrum.squaredAmplitudes(left);
    noise = noiseLevel(power, firstBin(spectrum), spectrum.stride, floor);
    const last = lines.at(-1);
    if (tried && last !== undefined && !stands(spectrum, noise, last)) {
      lines = before;
      break;
    }
  }
  return lines
    .map((line) => ({
      periodSeconds: 1 / line.frequency,
      amplitude: amplitudeOf(line),
      falseAlarmProbability: lineFalseAlarm(spectrum, noise, line),
    }))
    .filter((line) => line.falseAlarmProbability < LARGEST_FALSE_ALARM)
    .sort((a, b) => b.amplitude - a.amplitude)
    .filter((line, i, all) => all.slice(0, i).every((other) => apart(other, line, spectrum)))
    .slice(0, MOST_LINES);
}

/** Whether two lines are more than a resolution width from each other: sharpening may have moved them together. */
function apart(a: FoundLine, b: FoundLine, { resolutionHz }: Periodogram): boolean {
  return Math.abs(1 / a.periodSeconds - 1 / b.periodSeconds) > resolutionHz;
}

function firstBin({ resolutionHz, stepHz }: Periodogram): number {
  return Math.max(1, Math.ceil((FEWEST_TURNS * resolutionHz) / stepHz));
}

function falseAlarm({ trials }: Periodogram, { level, bins }: LocalNoise, power: number): number {
  return localFalseAlarmProbability(power / level, bins, trials);
}

function lineFalseAlarm(spectrum: Periodogram, noise: NoiseLevel, line: SharpLine): number {
  const around = noise(line.frequency / spectrum.stepHz);
  return falseAlarm(spectrum, around, amplitudeOf(line) ** 2);
}

function stands(spectrum: Periodogram, noise: NoiseLevel, line: SharpLine): boolean {
  return lineFalseAlarm(spectrum, noise, line) < LARGEST_FALSE_ALARM;
}

/** The frequency of the highest local maximum as a list; none when it is no higher than noise goes. */
function highestMaximum(spectrum: Periodogram, power: Float64Array, noise: NoiseLevel): number[] {
  let best = 0;
  for (let k = firstBin(spectrum); k < power.length - 1; k++) {
    const isMaximum = at(power, k) >= at(power, k - 1) && at(power, k) >= at(power, k + 1);
    if (isMaximum && (best === 0 || at(power, k) > at(power, best))) best = k;
  }
  if (best === 0 || at(power, best) < FEWEST_LEVELS * noise(best).level) return [];
  return [(best + offBin(power, best)) * spectrum.stepHz];
}

/** Frequencies of new local maxima that may be lines, strongest first, apart from each other and from known lines. */
function candidates(
  spectrum: Periodogram,
  power: Float64Array,
  noise: NoiseLevel,
  known: readonly SharpLine[],
): number[] {
  const { stepHz, resolutionHz, sidelobes } = spectrum;
  const maxima: { frequency: number; power: number }[] = [];
  for (let k = firstBin(spectrum); k < power.length - 1; k++) {
    const here = at(power, k);
    if (here < at(power, k - 1) || here < at(power, k + 1)) continue;
    const around = noise(k);
    // The quick test saves the exact probability for nearly all maxima.
    if (here < FEWEST_LEVELS * around.level) continue;
    if (falseAlarm(spectrum, around, BETWEEN_BINS * here) >= LARGEST_FALSE_ALARM) continue;
    maxima.push({ frequency: (k + offBin(power, k)) * stepHz, power: here });
  }
  maxima.sort((a, b) => b.power - a.power);
  const fresh: number[] = [];
  const believed = sidelobes * (maxima[0]?.power ?? 0);
  for (const { frequency, power: height } of maxima) {
    const taken = [...known.map((line) => line.frequency), ...fresh];
    if (taken.length >= MOST_LINES || height < believed) break;
    if (taken.every((other) => Math.abs(other - frequency) > resolutionHz)) fresh.push(frequency);
  }
  return fresh;
}

/** Top of the parabola through three bins: near enough to start from. */
function offBin(power: Float64Array, k: number): number {
  const bend = at(power, k - 1) - 2 * at(power, k) + at(power, k + 1);
  return bend === 0 ? 0 : (at(power, k - 1) - at(power, k + 1)) / (2 * bend);
}

/**
 * Fits each line again with the others taken off, until none moves: lines of few turns hang on
 * each other and on the trend. Changes `lines` and `left`.
 */
function sharpenTogether(
  { resolutionHz }: Periodogram,
  timeSeconds: Float64Array,
  left: Float64Array,
  lines: SharpLine[],
  circle: Circle,
): void {
  for (let sweep = 0; sweep < SWEEPS && lines.length > 1; sweep++) {
    let moved = 0;
    lines.forEach((line, i) => {
      addSine(left, timeSeconds, line, 1, circle);
      const sharper = sharpenLine(timeSeconds, left, line.frequency, resolutionHz / 4, circle);
      addSine(left, timeSeconds, sharper, -1, circle);
      lines[i] = sharper;
      const grown = Math.abs(amplitudeOf(sharper) / amplitudeOf(line) - 1);
      moved = Math.max(moved, grown, Math.abs(sharper.frequency - line.frequency) / resolutionHz);
    });
    if (moved < AT_REST) break;
  }
}
