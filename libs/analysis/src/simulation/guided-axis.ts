import { playStep } from '../mount/play';
import { SIDEREAL_RATE_ARCSEC_PER_SECOND } from '../spectrum/gear-periods';
import { type GuiderAxis, type NightScenario } from './night-scenario';

/** One axis under its guider: takes measured errors, gives pulses, and knows where they have put the star. */
export class GuidedAxis {
  /** Displacement of the star by all pulses so far, arcsec on the sky. */
  movedArcsec = 0;
  /** What the motor did, before the gap. */
  private drivenArcsec = 0;
  private expectedArcsecPerMs = 0;

  constructor(
    private readonly axis: GuiderAxis,
    private readonly guider: NightScenario['guider'],
    private readonly backlashArcsec: number,
  ) {}

  /** A new target: the calibration scales with cos(declination) in RA. */
  point(skyPerAxisAngle: number): void {
    const ratePerMs = (this.guider.guideRateSidereal * SIDEREAL_RATE_ARCSEC_PER_SECOND) / 1000;
    this.expectedArcsecPerMs = ratePerMs * skyPerAxisAngle;
  }

  /** Magnitude of the true response, arcsec on the sky per second. */
  responseArcsecPerSecond(direction: 'positive' | 'negative'): number {
    return 1000 * this.expectedArcsecPerMs * this.axis.response[direction];
  }

  /** Answers one measured error at once; returns the correction as the log writes it. */
  answer(errorArcsec: number): number {
    const { gain, minimumMoveArcsec, maximumMs, response } = this.axis;
    if (Math.abs(errorArcsec) < minimumMoveArcsec) return 0;
    const wanted = Math.round((-gain * errorArcsec) / this.expectedArcsecPerMs);
    const pulseMs = Math.min(maximumMs, Math.max(-maximumMs, wanted));
    if (pulseMs === 0) return 0;
    const factor = pulseMs > 0 ? response.positive : response.negative;
    this.drivenArcsec += pulseMs * this.expectedArcsecPerMs * factor;
    this.movedArcsec = playStep(this.movedArcsec, this.drivenArcsec, this.backlashArcsec);
    const written =
      this.guider.correctionUnit === 'ms' ? pulseMs : pulseMs * this.expectedArcsecPerMs;
    return this.guider.loggedSign === 'same' ? written : -written;
  }
}
