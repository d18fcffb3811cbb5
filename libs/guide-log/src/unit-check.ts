/** No guided star moves so far, and few unguided ones do. */
const MOST_RMS = 30;
/** No star is measured so well through the air. */
const LEAST_RMS_ARCSEC = 0.01;
/** Frames looked at; the RMS of more would say the same. */
const SAMPLE = 10_000;
/** Errors beyond this many times the median are no part of the usual motion. */
const OUTLIER = 10;

/** One sentence for each axis whose errors are hardly in the unit that they are said to have. */
export function unitWarnings(
  raError: Float64Array,
  decError: Float64Array,
  unit: 'arcsec' | 'guide px',
): string[] {
  return [
    { axis: 'RA', errors: raError },
    { axis: 'Dec', errors: decError },
  ].flatMap(({ axis, errors }) => {
    const rms = usualRms(errors);
    const isTooSmall = unit === 'arcsec' && rms > 0 && rms < LEAST_RMS_ARCSEC;
    if (!(rms > MOST_RMS) && !isTooSmall) return [];
    const moves = unit === 'arcsec' ? `${shown(rms)}″` : `${shown(rms)} guide px`;
    const than = isTooSmall ? 'less than any star' : 'far more than a guided star';
    return [`The star moves by ${moves} RMS in ${axis}, ${than}: check the unit of the errors.`];
  });
}

/** RMS about the lock position without the outliers; NaN where there is no error at all. */
function usualRms(errors: Float64Array): number {
  const every = Math.max(1, Math.ceil(errors.length / SAMPLE));
  const sizes = errors
    .filter((error, at) => at % every === 0 && !Number.isNaN(error))
    .map(Math.abs)
    .sort();
  const limit = OUTLIER * (sizes[Math.floor(sizes.length / 2)] ?? NaN);
  const usual = sizes.filter((size) => size <= limit);
  return Math.sqrt(usual.reduce((sum, size) => sum + size * size, 0) / usual.length);
}

function shown(rms: number): string {
  return String(Number(rms.toPrecision(2)));
}
