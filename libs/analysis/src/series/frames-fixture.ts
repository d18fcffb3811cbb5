import { type LogFrames } from './log-frames';

/** A log without any optional column, for specs to vary. */
export function plainFrames(
  timeSeconds: Float64Array,
  raError: Float64Array,
  decError: Float64Array,
): LogFrames {
  return {
    count: timeSeconds.length,
    timeSeconds,
    startEpochSeconds: null,
    raError,
    decError,
    errorUnit: 'arcsec',
    raCorrection: null,
    decCorrection: null,
    correctionUnit: 'ms',
    correctionSign: null,
    snr: null,
    brightness: null,
    state: null,
    run: null,
    runNames: [],
    target: null,
    targetNames: [],
    declinationDegrees: null,
    hourAngleHours: null,
    pierSide: null,
  };
}
