import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type RigDescription } from '../rig-description';
import { type LogFrames } from '../series/log-frames';
import { prepareRun } from '../series/prepare-run';
import { type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { measureMountMotion } from './measure-mount-motion';
import { type MountMotion } from './mount-motion';

const RIG: RigDescription = { mount: { wormPeriodSeconds: 480, guideRateSidereal: 0.5 } };
const shortNight = (seconds: number): NightScenario => ({
  ...PLAIN_NIGHT,
  runs: PLAIN_NIGHT.runs.map((run) => ({ ...run, durationSeconds: seconds })),
});
const measured = (frames: LogFrames, rig: RigDescription) =>
  measureMountMotion(prepareRun(frames, { from: 0, to: frames.count }, 1, []), rig);
const partsOf = ({ response, uncorrected, periodicError, loop, seeingFloor }: MountMotion) => ({
  response,
  uncorrected,
  periodicError,
  loop,
  seeingFloor,
});

/** Dotted paths of nulls without a reason; the bins of a folded curve may be empty. */
function unexplained(node: unknown, path: string, why: Record<string, string>): string[] {
  if (node === null) return why[path] ? [] : [path];
  if (typeof node !== 'object' || Array.isArray(node)) return [];
  return Object.entries(node).flatMap(([key, value]) =>
    unexplained(value, path === '' ? key : `${path}.${key}`, why),
  );
}
function holdsTogether(motion: MountMotion): void {
  const parts = partsOf(motion);
  // JSON writes NaN and infinities as null: a document without them comes back as it went.
  expect(JSON.parse(JSON.stringify(parts))).toEqual(parts);
  expect(unexplained(parts, '', motion.whyMissing)).toEqual([]);
}

describe('the mount measures of a run', () => {
  const { frames } = simulateNight(shortNight(2400), 5);

  it('have a reason beside every number that is missing, whatever the log lacks', () => {
    const zeros = new Float64Array(frames.count);
    const noise = zeros.map((_, n) => Math.sin(12.9898 * n) * 0.5);
    const logs: Partial<LogFrames>[] = [
      {},
      { raCorrection: null, decCorrection: null },
      { decCorrection: null },
      { raCorrection: zeros, decCorrection: zeros },
      { correctionUnit: 'arcsec' },
      { declinationDegrees: null },
      { correctionSign: 'opposite' },
      { raError: zeros, decError: zeros },
      { raError: zeros.map(() => NaN) },
      { raCorrection: noise, decCorrection: noise },
      { raError: frames.raError.map((error, n) => (n % 50 < 45 ? NaN : error)) },
    ];
    for (const log of logs) {
      holdsTogether(measured({ ...frames, ...log }, RIG));
      holdsTogether(measured({ ...frames, ...log }, {}));
    }
  });

  it('hold together in runs of any length', () => {
    for (const count of [2, 5, 29, 31, 60, 120, 300]) {
      const run = prepareRun(frames, { from: 0, to: count }, 1, []);
      holdsTogether(measureMountMotion(run, RIG));
      holdsTogether(measureMountMotion(run, {}));
    }
  });

  it('are the same for a log of the other sign', () => {
    const turned = {
      ...frames,
      raCorrection: frames.raCorrection!.map((given) => -given),
      decCorrection: frames.decCorrection!.map((given) => -given),
    };
    const [one, other] = [measured(frames, RIG), measured(turned, RIG)];
    expect(partsOf(other)).toEqual(partsOf(one));
    expect([one.ra.sign, one.ra.signFrom, other.ra.sign]).toEqual([1, 'log', -1]);
  });

  it('turn with the axes: a mirrored log has mirrored directions and the same sizes', () => {
    const mirrored = {
      ...frames,
      raError: frames.raError.map((error) => -error),
      raCorrection: frames.raCorrection!.map((given) => -given),
    };
    const [one, other] = [measured(frames, RIG), measured(mirrored, RIG)];
    // Sums of the same numbers in another order: equal to rounding.
    expect(other.response!.ra.positiveArcsecPerSecond).toBeCloseTo(
      one.response!.ra.negativeArcsecPerSecond!,
      6,
    );
    expect(other.periodicError!.peakToPeakArcsec).toBeCloseTo(
      one.periodicError!.peakToPeakArcsec,
      6,
    );
  });

  it('scale with the errors when the corrections are in arcsec too', () => {
    const arcsec = simulateNight(
      { ...shortNight(2400), guider: { ...PLAIN_NIGHT.guider, correctionUnit: 'arcsec' } },
      5,
    ).frames;
    fc.assert(
      fc.property(fc.double({ min: 0.2, max: 5, noNaN: true }), (factor) => {
        const times = (values: Float64Array) => values.map((value) => factor * value);
        const scaled = {
          ...arcsec,
          raError: times(arcsec.raError),
          decError: times(arcsec.decError),
          raCorrection: times(arcsec.raCorrection!),
          decCorrection: times(arcsec.decCorrection!),
        };
        const [one, other] = [measured(arcsec, RIG), measured(scaled, RIG)];
        // Rounding alone: relative 1e-6 leaves room for the iterations of the fit.
        const ratio =
          other.periodicError!.peakToPeakArcsec / one.periodicError!.peakToPeakArcsec / factor;
        expect(ratio).toBeCloseTo(1, 6);
        expect(other.seeingFloor!.raArcsec! / one.seeingFloor!.raArcsec! / factor).toBeCloseTo(
          1,
          6,
        );
        expect(other.loop.ra!.gain).toBeCloseTo(one.loop.ra!.gain!, 6);
      }),
      { numRuns: 3 },
    );
  });

  it('take the sign that the map tells over that of the log', () => {
    const motion = measured({ ...frames, correctionSign: 'opposite' }, RIG);
    expect([motion.ra.sign, motion.ra.signFrom]).toEqual([-1, 'map']);
  });

  it('keep quiet about periodic error under two turns, and say how many there were', () => {
    const motion = measured(simulateNight(shortNight(900), 2).frames, RIG);
    expect(motion.periodicError).toBeNull();
    expect(motion.whyMissing['periodicError']).toContain('1.9 turns');
  });

  it('take an unguided axis as it is: without corrections the error is the motion', () => {
    const guider = {
      ...PLAIN_NIGHT.guider,
      ra: { ...PLAIN_NIGHT.guider.ra, gain: 0 },
      dec: { ...PLAIN_NIGHT.guider.dec, gain: 0 },
    };
    const motion = measured(simulateNight({ ...shortNight(3600), guider }, 4).frames, RIG);
    // The scenario's worm: 11.8 ″ peak to peak by its three harmonics; SCIENCE 7 allows 5 %.
    expect(motion.periodicError!.peakToPeakArcsec).toBeGreaterThan(0.95 * wormPeakToPeak());
    expect(motion.periodicError!.peakToPeakArcsec).toBeLessThan(1.05 * wormPeakToPeak());
    expect(motion.loop.ra!.gain).toBeNull();
  });
});

/** Of PLAIN_NIGHT's worm, by evaluating its harmonics at 3600 places. */
function wormPeakToPeak(): number {
  const { harmonics } = PLAIN_NIGHT.drive.worm;
  const curve = Array.from({ length: 3600 }, (_, i) =>
    harmonics.reduce((sum, { order, amplitudeArcsec, phaseDegrees }) => {
      const angle = 2 * Math.PI * ((order * i) / 3600 + phaseDegrees / 360);
      return sum + amplitudeArcsec * Math.cos(angle);
    }, 0),
  );
  return Math.max(...curve) - Math.min(...curve);
}
