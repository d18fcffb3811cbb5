import { type RigDescription } from '@stillpier/analysis';
import { type Setup } from '@stillpier/contract';

/** Optics as a form holds them: any number may still be missing. */
export interface OpticsEntry {
  readonly focalLengthMm: number | null;
  readonly apertureMm: number | null;
  readonly pixelUm: number | null;
  readonly binning: number | null;
}

export interface SetupEntry {
  readonly imaging: OpticsEntry & { readonly sensor: Setup['imaging']['sensor'] };
  readonly guiding: OpticsEntry;
  readonly seeingFwhmArcsec: number | null;
}

/** The part of an entry that can be reckoned with: a number that is missing, zero or negative is not known. */
export function knownOptics({ imaging, guiding, seeingFwhmArcsec }: SetupEntry): RigDescription {
  return {
    imaging: { ...known(imaging), sensor: imaging.sensor },
    guiding: known(guiding),
    seeingFwhmArcsec: positive(seeingFwhmArcsec),
  };
}

function known({ focalLengthMm, apertureMm, pixelUm, binning }: OpticsEntry) {
  return {
    focalLengthMm: positive(focalLengthMm),
    apertureMm: positive(apertureMm),
    pixelUm: positive(pixelUm),
    binning: positive(binning),
  };
}

function positive(entry: number | null): number | undefined {
  return entry !== null && entry > 0 ? entry : undefined;
}
