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
    // One step of mount/play: the star rests inside the gap and is pushed only at its ends.
    const half = this.backlashArcsec / 2;
    const pushed = Math.max(this.movedArcsec, this.drivenArcsec - half);
    this.movedArcsec = Math.min(pushed, this.drivenArcsec + half);
    const written =
      this.guider.correctionUnit === 'ms' ? pulseMs : pulseMs * this.expectedArcsecPerMs;
    return this.guider.loggedSign === 'same' ? written : -written;
  }
}
