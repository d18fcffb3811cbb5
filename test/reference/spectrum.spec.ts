import {
  amplitudeSpectrum,
  coherentGain,
  effectiveDuration,
  falseAlarmProbability,
  fastLombScargle,
  fitLines,
  hannLine,
  lineResponse,
  lombScargle,
  noiseBandwidthBins,
  seriesPeaks,
  SIDEREAL_DAY_SECONDS,
  spectralWindow,
  type WindowName,
} from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { allowed, check, columns, type Entry } from './checks';

const within = (got: number, expected: number, tolerance: { rel?: number; abs?: number }) => {
  expect(Math.abs(got - expected)).toBeLessThanOrEqual(allowed(tolerance, expected));
};
const decibels = (ratio: number) => 20 * Math.log10(ratio);

/** Full width at which a window's response to a line has fallen by 3 dB, in bins, by bisection. */
const threeDecibelWidth = (window: Float64Array) => {
  let [near, far] = [0, 3];
  for (let step = 0; step < 40; step++) {
    const middle = (near + far) / 2;
    if (decibels(lineResponse(window, middle)) > -3) near = middle;
    else far = middle;
  }
  return near + far;
};

describe('window constants', () => {
  const N = 4096;
  const windows: [WindowName, string, string | null][] = [
    ['rectangular', 'rectangular', null],
    ['hann', 'hann', '8.2.hann'],
    ['hamming', 'hamming', '8.2.hamming'],
    ['blackmanHarris', 'blackman_harris_4term_92dB', '8.2.blackman_harris_4term_92dB'],
    ['flatTop', 'HFT95', '8.2.HFT95'],
  ];
  it.each(windows)('%s has the gain, bandwidth, loss and width of %s', (name, id, published) => {
    const { expected, title } = check(`8.1.${id}`) as Entry<unknown, Record<string, number>>;
    const window = spectralWindow(name, N);
    // Exact for any length but the loss and the width, which reach their limit as 1/N².
    within(coherentGain(window), expected['coherent_gain']!, { abs: 1e-9 });
    within(noiseBandwidthBins(window), expected['nenbw']!, { abs: 1e-6 });
    within(decibels(lineResponse(window, 0.5)), expected['scalloping_db']!, { abs: 1e-5 });
    within(threeDecibelWidth(window), expected['w3db_bins']!, { abs: 1e-5 });
    if (published === null) return;
    const table = check(published) as Entry<unknown, { nenbw: number; max_abs_error_db: number }>;
    expect(Math.abs(noiseBandwidthBins(window) - table.expected.nenbw), title).toBeLessThan(6e-5);
  });

  it.each<[WindowName, string]>([
    ['rectangular', 'rectangular'],
    ['hann', 'hann'],
    ['hamming', 'hamming'],
    ['blackmanHarris', 'blackman_harris_4term_92dB'],
  ])('%s has the two decimals of an old table: %s', (name, id) => {
    const { expected, tolerance } = check(`8.3.${id}`) as Entry<
      unknown,
      { coherent_gain: number; enbw: number; scallop_db: number }
    >;
    const window = spectralWindow(name, N);
    within(coherentGain(window), expected.coherent_gain, tolerance);
    within(noiseBandwidthBins(window), expected.enbw, tolerance);
    within(-decibels(lineResponse(window, 0.5)), expected.scallop_db, tolerance);
  });

  it('a periodic Hann window of 64 sums to 32 and its squares to 24 (8.4)', () => {
    const { expected, tolerance } = check('8.4') as Entry<
      unknown,
      { sum_w: number; sum_w2: number; nenbw: number }
    >;
    const window = spectralWindow('hann', 64);
    within(coherentGain(window) * 64, expected.sum_w, tolerance);
    within(
      window.reduce((sum, w) => sum + w * w, 0),
      expected.sum_w2,
      tolerance,
    );
    within(noiseBandwidthBins(window), expected.nenbw, tolerance);
  });
});

describe('the two-bin rule', () => {
  it.each(['8.6a', '8.6b', '8.6c', '8.6d'])('finds place and height of the line of %s', (id) => {
    const { inputs, expected, tolerance } = check(id) as Entry<
      { N: number; true_bin: number; phase: number },
      { hann_ratio: number; amp_hann_exact: number }
    >;
    const window = spectralWindow('hann', inputs.N);
    const wave = window.map(
      (w, n) => w * Math.cos((2 * Math.PI * inputs.true_bin * n) / inputs.N + inputs.phase),
    );
    const amplitudes = Float64Array.from({ length: inputs.N / 2 }, (_, k) => {
      let [real, imaginary] = [0, 0];
      wave.forEach((value, n) => {
        real += value * Math.cos((2 * Math.PI * k * n) / inputs.N);
        imaginary += value * Math.sin((2 * Math.PI * k * n) / inputs.N);
      });
      return (2 * Math.hypot(real, imaginary)) / (inputs.N / 2);
    });
    const line = hannLine(amplitudes, amplitudes.indexOf(Math.max(...amplitudes)));
    within(line.bin, expected.hann_ratio, tolerance);
    within(line.amplitude, expected.amp_hann_exact, tolerance);
  });
});

it('the amplitude spectrum of two sines is that of 8.5', () => {
  const { inputs, expected } = check('8.5') as Entry<{ N: number }, { A: number[] }>;
  const x = Float64Array.from({ length: inputs.N }, (_, n) => {
    const turns = (2 * Math.PI * n) / inputs.N;
    return 3 * Math.cos(5 * turns + 0.4) + 1.2 * Math.sin(11.5 * turns);
  });
  const { size, amplitudes } = amplitudeSpectrum(inputs.N);
  const shown = amplitudes(x);
  [4, 5, 6, 10, 11, 12, 13].forEach((bin, i) => {
    // Padding keeps every natural bin. The straight line taken off before takes a little of so slow waves with it.
    within(shown[(bin * size) / inputs.N]!, expected.A[i]!, { abs: 0.04 });
  });
});

describe('Lomb-Scargle, documented example', () => {
  const { t, y } = columns('ls_doc_example.csv') as { t: Float64Array; y: Float64Array };
  const duration = t.at(-1)! - t[0]!;
  const power = check('8.7a') as Entry<{ fmax: number }, { power_max: number }>;
  const alarm = check('8.7b') as Entry<
    { z: number; N: number; fmax: number },
    { baluev: number; naive: number }
  >;

  it(`the highest power on the documented grid is exact (${power.title})`, () => {
    const step = 1 / duration / 5;
    const frequencies = Float64Array.from(
      { length: Math.round(power.inputs.fmax / step) },
      (_, k) => (k + 0.5) * step,
    );
    within(Math.max(...lombScargle(t, y, frequencies)), power.expected.power_max, power.tolerance);
  });

  it('the fast form gives the exact power at every frequency of its grid', () => {
    const fast = fastLombScargle(t, power.inputs.fmax);
    const variance =
      y.reduce((sum, v) => sum + v * v, 0) / y.length -
      (y.reduce((sum, v) => sum + v, 0) / y.length) ** 2;
    const explained = fast.explained(y);
    const grid = explained.map((_, k) => Math.max(k, 1) * fast.step);
    const exact = lombScargle(t, y, grid);
    const worst = exact.reduce(
      (most, p, k) => (k === 0 ? most : Math.max(most, Math.abs(p - explained[k]! / variance))),
      0,
    );
    // The Gaussian spreading of 6 cells to each side is good for 1e-6; the plain table form misses by over 1e-2 here.
    expect(worst).toBeLessThan(1e-5);
  });

  it(`its false-alarm probability is the published one (${alarm.title})`, () => {
    const { z, N, fmax } = alarm.inputs;
    const trials = fmax * effectiveDuration(t);
    within(falseAlarmProbability(z, N, trials), alarm.expected.baluev, alarm.tolerance);
  });

  it('the published levels have the false-alarm probabilities that they stand for (8.7c)', () => {
    const { inputs, expected } = check('8.7c') as Entry<{ fap: number[] }, { levels: number[] }>;
    const trials = alarm.inputs.fmax * effectiveDuration(t);
    expected.levels.forEach((level, i) => {
      // A level is printed to 1e-8; its probability changes by 40 times that, relatively.
      within(falseAlarmProbability(level, t.length, trials), inputs.fap[i]!, { rel: 1e-6 });
    });
  });
});

describe('uneven synthetic series', () => {
  const { t_s: t, err_arcsec: y } = columns('synth_uneven.csv');

  it('the exact periodogram has the given power at the given frequencies (8.8a)', () => {
    const { inputs, expected, tolerance } = check('8.8a') as Entry<
      { freq_hz: number[] },
      { power: number[] }
    >;
    const powers = lombScargle(t!, y!, inputs.freq_hz);
    expected.power.forEach((p, i) => {
      within(powers[i]!, p, tolerance);
    });
  });

  it('harmonics and a trend fitted together have the given amplitudes and errors (8.8c)', () => {
    const { inputs, expected, tolerance } = check('8.8c') as Entry<
      { freq_hz: number[] },
      {
        slope_arcsec_per_s: number;
        amp: number[];
        phase: number[];
        sigma_amp: number[];
        resid_sd: number;
      }
    >;
    const fit = fitLines(t!, y!, inputs.freq_hz, 1);
    within(fit.polynomial[1]!, expected.slope_arcsec_per_s, tolerance);
    within(fit.residualDeviation, expected.resid_sd, tolerance);
    fit.lines.forEach((line, i) => {
      within(line.amplitude, expected.amp[i]!, tolerance);
      within(line.phaseRadians, expected.phase[i]!, tolerance);
      within(line.amplitudeError, expected.sigma_amp[i]!, tolerance);
    });
  });

  it('with trend and worm taken off, the fast line stands out as given (8.8d)', () => {
    const { expected, tolerance } = check('8.8d') as Entry<
      unknown,
      { freq_hz: number; power: number; 'log10_fap_baluev_fmax0.2': number }
    >;
    const worm = check('8.8a') as Entry<{ freq_hz: number[] }, unknown>;
    const fit = fitLines(t!, y!, worm.inputs.freq_hz.slice(0, 2), 1);
    const middle = t!.reduce((sum, time) => sum + time, 0) / t!.length;
    const left = y!.map((value, i) => {
      const time = t![i]!;
      const waves = fit.lines.reduce(
        (sum, { frequency, amplitude, phaseRadians }) =>
          sum + amplitude * Math.cos(2 * Math.PI * frequency * time + phaseRadians),
        0,
      );
      return value - waves - fit.polynomial[0]! - fit.polynomial[1]! * (time - middle);
    });
    const [power] = lombScargle(t!, left, [expected.freq_hz]);
    within(power!, expected.power, tolerance);
    const alarm = falseAlarmProbability(power!, t!.length, 0.2 * effectiveDuration(t!));
    within(Math.log10(alarm), expected['log10_fap_baluev_fmax0.2'], { rel: 1e-6 });
  });

  it('its three lines are found and two of them named by the worm', () => {
    const worm = SIDEREAL_DAY_SECONDS / 180;
    const named = [
      { label: 'worm', periodSeconds: worm },
      { label: 'worm / 2', periodSeconds: worm / 2 },
    ];
    const peaks = seriesPeaks(t!, y!, 3, named);
    expect(peaks.map(({ label }) => label)).toEqual(['worm', 'worm / 2', null]);
    // Truth of the recipe: 8, 2.5 and 0.9 ″; three standard errors of the joint fit are 0.11.
    [8, 2.5, 0.9].forEach((amplitude, i) => {
      expect(Math.abs(peaks[i]!.amplitudeArcsec - amplitude)).toBeLessThan(0.11);
    });
    expect(Math.abs(peaks[2]!.periodSeconds / 37.3 - 1)).toBeLessThan(0.001);
  });
});

describe('real series', () => {
  it('the monthly sunspots turn in 11.25 years (8.11b)', () => {
    const { year, month, wolf_number: y } = columns('sunspot_monthly_1749_1947.csv');
    const { expected } = check('8.11b') as Entry<unknown, { period_yr: number; power: number }>;
    const t = year!.map((value, i) => value + (month![i]! - 0.5) / 12);
    // The published scan, 0.01 … 0.25 a year in 48000 steps, looked at around its highest peak.
    const step = 0.24 / 48000;
    const frequencies = Float64Array.from({ length: 6000 }, (_, k) => 0.075 + k * step);
    const powers = lombScargle(t, y!, frequencies);
    const best = powers.indexOf(Math.max(...powers));
    within(1 / frequencies[best]!, expected.period_yr, { rel: 1e-6 });
    within(powers[best]!, expected.power, { rel: 1e-6 });
    // The fast form finds the same peak within its own grid.
    const fast = fastLombScargle(t, 0.25);
    const explained = fast.explained(y!);
    const top = explained.indexOf(Math.max(...explained)) * fast.step;
    expect(Math.abs(top - 1 / expected.period_yr)).toBeLessThan(fast.step);
  });

  it('the CO2 of Mauna Loa has its annual and half-yearly cycle (8.12, 8.12b)', () => {
    const { year, month, co2_ppm: y } = columns('co2_mlo_noaa_1974_1987.csv');
    const t = year!.map((value, i) => value + (month![i]! - 0.5) / 12);
    const { expected, tolerance } = check('8.12') as Entry<
      unknown,
      { slope_ppm_per_yr: number; amp: number[]; sigma_amp: number[]; resid_sd: number }
    >;
    const fit = fitLines(t, y!, [1, 2], 2);
    within(fit.polynomial[1]!, expected.slope_ppm_per_yr, tolerance);
    within(fit.residualDeviation, expected.resid_sd, tolerance);
    fit.lines.forEach((line, i) => {
      within(line.amplitude, expected.amp[i]!, tolerance);
      within(line.amplitudeError, expected.sigma_amp[i]!, tolerance);
    });
    const scan = check('8.12b') as Entry<unknown, { period_yr: number; power: number }>;
    const trend = fitLines(t, y!, [], 2).polynomial;
    const middle = t.reduce((sum, time) => sum + time, 0) / t.length;
    const left = y!.map((value, i) => {
      const off = t[i]! - middle;
      return value - trend[0]! - trend[1]! * off - trend[2]! * off * off;
    });
    const frequencies = Float64Array.from({ length: 2001 }, (_, k) => 0.9 + k * 1e-4);
    const powers = lombScargle(t, left, frequencies);
    const best = powers.indexOf(Math.max(...powers));
    within(1 / frequencies[best]!, scan.expected.period_yr, scan.tolerance);
    within(powers[best]!, scan.expected.power, scan.tolerance);
  });

  it('the hourly normals of Seattle have their annual, daily and half-daily cycles (8.13)', () => {
    const { expected, tolerance } = check('8.13') as Entry<
      unknown,
      { amp: number[]; phase: number[]; resid_sd: number }
    >;
    const { temperature_c: y } = columns('seattle_hourly_normals_temp.csv');
    const first = check('8.13') as Entry<{ period_d: number[] }, { n: number }>;
    expect(y!.length).toBe(first.expected.n);
    // One value an hour from 01:00 on, in days.
    const t = y!.map((_, i) => (i + 1) / 24);
    const fit = fitLines(
      t,
      y!,
      first.inputs.period_d.map((days) => 1 / days),
      0,
    );
    within(fit.residualDeviation, expected.resid_sd, tolerance);
    fit.lines.forEach((line, i) => {
      within(line.amplitude, expected.amp[i]!, tolerance);
      within(line.phaseRadians, expected.phase[i]!, tolerance);
    });
  });

  it('the beam deflections of NIST have one line, at 0.3018 a sample (8.10b)', () => {
    const { y } = columns('nist_lew.csv');
    const { expected } = check('8.10b') as Entry<
      unknown,
      { C: number; AMP: number; FREQ: number; resid_sd: number }
    >;
    const t = y!.map((_, i) => i + 1);
    const fit = fitLines(t, y!, [expected.FREQ], 0);
    within(fit.lines[0]!.amplitude, Math.abs(expected.AMP), { rel: 1e-6 });
    within(fit.residualDeviation * Math.sqrt(197 / 196), expected.resid_sd, { rel: 1e-6 });
    const [peak] = seriesPeaks(t, y!, 1, []);
    // A trend stands beside the sine here and a mean alone there: within SCIENCE's 0.1 %.
    expect(Math.abs(1 / peak!.periodSeconds / expected.FREQ - 1)).toBeLessThan(1e-3);
    const highest = check('8.10c') as Entry<unknown, { bin: number }>;
    expect(Math.round(y!.length / peak!.periodSeconds), highest.title).toBe(highest.expected.bin);
  });

  it('the yearly sunspots turn in 11.0 years (8.11a)', () => {
    const { year: t, sunspot_number: y } = columns('sunspot_yearly_1700_2008.csv');
    const { expected } = check('8.11a') as Entry<unknown, { period_yr: number; power: number }>;
    const frequencies = Float64Array.from({ length: 49001 }, (_, k) => 0.005 + (k * 0.245) / 49000);
    const powers = lombScargle(t!, y!, frequencies);
    const best = powers.indexOf(Math.max(...powers));
    within(1 / frequencies[best]!, expected.period_yr, { rel: 1e-6 });
    within(powers[best]!, expected.power, { rel: 1e-6 });
  });
});
