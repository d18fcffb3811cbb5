import { type Spectrum } from '../analysis-document';
import { at } from '../statistics/at';
import { linearTrend } from '../statistics/linear-trend';
import { amplitudeSpectrum } from './amplitude-spectrum';
import { trialsUpTo } from './false-alarm';
import { fastLombScargle } from './fast-lomb-scargle';

/** The spectrum of any series on one set of times; built once, each series then costs one transform. */
export interface Periodogram {
  readonly method: Spectrum['method'];
  /** Bin k is k · stepHz. */
  readonly stepHz: number;
  /** 1 / duration: two lines closer than this merge. */
  readonly resolutionHz: number;
  /** Bins from one independent value of noise to the next. */
  readonly stride: number;
  /** How many independent chances noise has of a peak. */
  readonly trials: number;
  /** A strong line raises its surroundings to this part of its own power: nothing there is believed before it is taken off. */
  readonly sidelobes: number;
  /** Squared amplitude (half peak-to-peak) at each bin; 0 at bin 0. */
  readonly squaredAmplitudes: (values: Float64Array) => Float64Array;
}

/** Frames count as evenly spaced when none is farther than this part of a cadence from its place. */
const EVEN_WITHIN = 0.05;
/** Highest sidelobe of a Hann window, −31.5 dB, in power, with some room. */
const HANN_SIDELOBES = 0.002;
/** The highest frequency is at most so many times the number of frames over the duration. */
const DENSEST = 4;
/** Room above the highest sidelobe of uneven sampling: two lines' sidelobes may add. */
const SIDELOBE_ROOM = 1.5;

/**
 * The periodogram that fits the times: FFT with a Hann window for even sampling without gaps, else the generalised
 * Lomb-Scargle periodogram, up to the Nyquist frequency of the cadence. O(n log n).
 *
 * @param timeSeconds n ascending times, n ≥ 8.
 * @param cadenceSeconds Usual spacing of the frames.
 */
export function periodogram(timeSeconds: Float64Array, cadenceSeconds: number): Periodogram {
  return isEven(timeSeconds)
    ? hannPeriodogram(timeSeconds)
    : lombScarglePeriodogram(timeSeconds, cadenceSeconds);
}

function isEven(timeSeconds: Float64Array): boolean {
  const first = at(timeSeconds, 0);
  const spacing = (at(timeSeconds, timeSeconds.length - 1) - first) / (timeSeconds.length - 1);
  return timeSeconds.every(
    (time, i) => Math.abs(time - first - i * spacing) <= EVEN_WITHIN * spacing,
  );
}

function hannPeriodogram(timeSeconds: Float64Array): Periodogram {
  const n = timeSeconds.length;
  const duration = at(timeSeconds, n - 1) - at(timeSeconds, 0);
  const spacing = duration / (n - 1);
  const { size, amplitudes } = amplitudeSpectrum(n);
  return {
    method: 'fft',
    stepHz: 1 / (size * spacing),
    resolutionHz: 1 / duration,
    // The window joins neighbouring bins: every second natural one is independent.
    stride: Math.round((2 * size) / n),
    trials: trialsUpTo(timeSeconds, 0.5 / spacing),
    sidelobes: HANN_SIDELOBES,
    squaredAmplitudes: (values) => {
      const powers = amplitudes(values).map((amplitude) => amplitude * amplitude);
      powers[0] = 0;
      return powers;
    },
  };
}

function lombScarglePeriodogram(timeSeconds: Float64Array, cadenceSeconds: number): Periodogram {
  const duration = at(timeSeconds, timeSeconds.length - 1) - at(timeSeconds, 0);
  // Frames in bursts with long gaps between would need an endless grid for the Nyquist frequency of the bursts.
  const highest = Math.min(0.5 / cadenceSeconds, (DENSEST * timeSeconds.length) / duration);
  const { step, sidelobes, explained } = fastLombScargle(timeSeconds, highest);
  return {
    method: 'lomb-scargle',
    stepHz: step,
    resolutionHz: 1 / duration,
    stride: Math.round(1 / (duration * step)),
    trials: trialsUpTo(timeSeconds, highest),
    sidelobes: Math.min(1, SIDELOBE_ROOM * sidelobes),
    squaredAmplitudes: (values) => {
      const { intercept, slope } = linearTrend(timeSeconds, values);
      const left = values.map((value, i) => value - intercept - slope * at(timeSeconds, i));
      return explained(left).map((variance) => 2 * Math.max(0, variance));
    },
  };
}
