import { type RigDescription } from '../rig-description';

/** Mean sidereal day, 86400 / 1.002737909350795 s: S. Aoki et al., Astron. Astrophys. 105 (1982) 359. */
export const SIDEREAL_DAY_SECONDS = 86164.090530833;

/** Sidereal rate, 1296000 ″ / sidereal day. */
export const SIDEREAL_RATE_ARCSEC_PER_SECOND = 1296000 / SIDEREAL_DAY_SECONDS;

/** Time of one turn of a single-start worm on a wheel of so many teeth that follows the sky. */
export function wormPeriodSeconds(teeth: number): number {
  return SIDEREAL_DAY_SECONDS / teeth;
}

/** The rig's worm period: as told, else from the teeth of the wheel; null when it tells neither. */
export function rigWormPeriodSeconds(rig: RigDescription): number | null {
  const { wormPeriodSeconds: told, wormTeeth } = rig.mount ?? {};
  if (told !== undefined) return told;
  return wormTeeth === undefined ? null : wormPeriodSeconds(wormTeeth);
}
