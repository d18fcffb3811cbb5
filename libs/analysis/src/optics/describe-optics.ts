import { type Optics, type WhyMissing } from '../analysis-document';
import { type GuideOptics, type RigDescription } from '../rig-description';
import {
  focalLengthRatio,
  plateScaleArcsecPerPx,
  scaleRatio,
  seeingSamplingPx,
} from './plate-scale';
import { dawesArcsec, rayleighArcsec, VISIBLE_WAVELENGTH_NM } from './resolution-limit';

/**
 * The document's `optics`: every figure that the rig's description allows, and for each that it does not one
 * sentence that says what is missing. Binning counts as 1 where it is not given.
 */
export function describeOptics(rig: RigDescription): Optics {
  const { imaging, guiding, seeingFwhmArcsec } = rig;
  const imagingScale = cameraScaleArcsecPerPx(imaging);
  const guideScale = cameraScaleArcsecPerPx(guiding);
  const whyMissing: WhyMissing = {};
  /** The figure, or null with a reason that names what the rig does not tell. */
  const figure = (key: keyof Optics, needs: string[], known: number | null): number | null => {
    if (known === null) whyMissing[key] = `The rig's description does not tell ${joined(needs)}.`;
    return known;
  };
  const missing = (...needs: readonly (readonly [unknown, string])[]): string[] =>
    needs.filter(([known]) => known === undefined).map(([, name]) => name);
  const imagingNeeds = missing(
    [imaging?.focalLengthMm, 'the imaging focal length'],
    [imaging?.pixelUm, "the imaging camera's pixel size"],
  );
  const guideNeeds = missing(
    [guiding?.focalLengthMm, 'the guide focal length'],
    [guiding?.pixelUm, "the guide camera's pixel size"],
  );
  const apertureNeeds = missing([imaging?.apertureMm, 'the imaging aperture']);
  const seeingNeeds = [...imagingNeeds, ...missing([seeingFwhmArcsec, 'the seeing'])];
  const focalNeeds = missing(
    [imaging?.focalLengthMm, 'the imaging focal length'],
    [guiding?.focalLengthMm, 'the guide focal length'],
  );
  const apertureMm = imaging?.apertureMm;
  return {
    imagingScaleArcsecPerPx: figure('imagingScaleArcsecPerPx', imagingNeeds, imagingScale),
    guideScaleArcsecPerPx: figure('guideScaleArcsecPerPx', guideNeeds, guideScale),
    scaleRatio: figure(
      'scaleRatio',
      [...imagingNeeds, ...guideNeeds],
      imagingScale === null || guideScale === null ? null : scaleRatio(guideScale, imagingScale),
    ),
    focalLengthRatio: figure(
      'focalLengthRatio',
      focalNeeds,
      imaging?.focalLengthMm === undefined || guiding?.focalLengthMm === undefined
        ? null
        : focalLengthRatio(guiding.focalLengthMm, imaging.focalLengthMm),
    ),
    dawesArcsec: figure(
      'dawesArcsec',
      apertureNeeds,
      apertureMm === undefined ? null : dawesArcsec(apertureMm),
    ),
    rayleighArcsec: figure(
      'rayleighArcsec',
      apertureNeeds,
      apertureMm === undefined ? null : rayleighArcsec(apertureMm, VISIBLE_WAVELENGTH_NM),
    ),
    seeingSamplingPx: figure(
      'seeingSamplingPx',
      seeingNeeds,
      imagingScale === null || seeingFwhmArcsec === undefined
        ? null
        : seeingSamplingPx(seeingFwhmArcsec, imagingScale),
    ),
    whyMissing,
  };
}

/** Scale of a camera behind a telescope; null where focal length or pixel size is not told. */
export function cameraScaleArcsecPerPx(optics: GuideOptics | undefined): number | null {
  if (optics?.focalLengthMm === undefined || optics.pixelUm === undefined) return null;
  return plateScaleArcsecPerPx(optics.pixelUm, optics.binning ?? 1, optics.focalLengthMm);
}

function joined(names: readonly string[]): string {
  const last = names.at(-1) ?? '';
  return names.length < 2 ? last : `${names.slice(0, -1).join(', ')} and ${last}`;
}
