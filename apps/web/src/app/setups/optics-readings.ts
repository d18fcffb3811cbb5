import {
  describeOptics,
  guideScaleLimit,
  type Optics,
  USUAL_CENTROID_FRACTION_PX,
} from '@stillpier/analysis';
import { arcsecText, ratioText } from '../figures/measure-text';
import { knownOptics, type SetupEntry } from './known-optics';

/** One figure that follows from a setup, with one sentence on what it means. */
export interface Reading {
  readonly name: string;
  /** With its unit; null while it cannot be worked out, and then `meaning` says what is missing. */
  readonly figure: string | null;
  readonly meaning: string;
}

export interface OpticsReadings {
  /** The answer of the page, in parts; its numbers are strong. */
  readonly sentence: readonly { readonly text: string; readonly strong: boolean }[];
  readonly scaleRatio: number | null;
  readonly imaging: readonly Reading[];
  readonly guiding: readonly Reading[];
  readonly sky: readonly Reading[];
}

/** Everything that follows from the optics of a setup, grouped as the form is. */
export function opticsReadings(setup: SetupEntry): OpticsReadings {
  const optics = describeOptics(knownOptics(setup));
  const read = (
    name: string,
    key: Exclude<keyof Optics, 'whyMissing'>,
    say: (figure: number) => Omit<Reading, 'name'>,
  ): Reading => {
    const figure = optics[key];
    if (figure !== null) return { name, ...say(figure) };
    return { name, figure: null, meaning: optics.whyMissing[key] ?? '' };
  };
  return {
    sentence: sentence(optics.scaleRatio),
    scaleRatio: optics.scaleRatio,
    imaging: [
      read('Imaging scale', 'imagingScaleArcsecPerPx', imagingScale),
      read("Dawes' limit", 'dawesArcsec', dawes),
      read("Rayleigh's limit", 'rayleighArcsec', rayleigh),
    ],
    guiding: [
      read('Guide scale', 'guideScaleArcsecPerPx', guideScale),
      read('Guide to imaging scale', 'scaleRatio', scaleRatio),
      read('Guide to imaging focal length', 'focalLengthRatio', (ratio) =>
        focalLengthRatio(ratio, optics.scaleRatio),
      ),
    ],
    sky: [read('Seeing disc', 'seeingSamplingPx', (px) => sampling(px, setup.imaging.sensor))],
  };
}

function sentence(ratio: number | null): OpticsReadings['sentence'] {
  const plain = (text: string) => ({ text, strong: false });
  if (ratio === null) {
    const text =
      'Two focal lengths and two pixel sizes tell how fine a guide error a setup can see.';
    return [plain(text)];
  }
  const { seenErrorImagingPx, staysUnder } = guideScaleLimit(ratio, USUAL_CENTROID_FRACTION_PX);
  return [
    plain('This setup can see a guide error from '),
    { text: `${ratioText(seenErrorImagingPx)} px`, strong: true },
    plain(
      staysUnder
        ? ' of the imaging camera up, within the third of a pixel that is wanted.'
        : ' of the imaging camera up; the third of a pixel that is wanted needs a finer guide scale.',
    ),
  ];
}

const perPx = (arcsec: number): string => `${arcsecText(arcsec)} per px`;

function imagingScale(arcsecPerPx: number) {
  return {
    figure: perPx(arcsecPerPx),
    meaning: `What one pixel of the imaging camera covers on the sky; a third of it is ${arcsecText(arcsecPerPx / 3)}.`,
  };
}

function dawes(arcsec: number) {
  return {
    figure: arcsecText(arcsec),
    meaning:
      'The closest double star of two equal parts that an eye could part with this aperture.',
  };
}

function rayleigh(arcsec: number) {
  return {
    figure: arcsecText(arcsec),
    meaning:
      "Where one star's centre falls on the first dark ring of the other, in green light (550 nm); seeing wider than this hides it.",
  };
}

function guideScale(arcsecPerPx: number) {
  const seen = arcsecText(arcsecPerPx * USUAL_CENTROID_FRACTION_PX);
  return {
    figure: perPx(arcsecPerPx),
    meaning: `What one guide pixel covers; a camera that places a star to a tenth of a pixel sees errors from ${seen} up.`,
  };
}

function scaleRatio(ratio: number) {
  const limit = guideScaleLimit(ratio, USUAL_CENTROID_FRACTION_PX);
  const there = limit.staysUnder ? 'this setup is there' : 'this setup is not there';
  return {
    figure: ratioText(ratio),
    meaning: `Up to a ratio of ${ratioText(limit.largestScaleRatio)} the smallest error that the guide camera can see stays under a third of an imaging pixel; ${there}, at ${ratioText(limit.seenErrorImagingPx)} px.`,
  };
}

/** Halving the focal length doubles the scale, so the least ratio follows from how far the scale ratio may go. */
function focalLengthRatio(ratio: number, setupScaleRatio: number | null) {
  const history =
    'In the days of guiding by eye the guide scope had twice the focal length of the imaging scope (2.0); a camera that measures to a fraction of a pixel needs far less';
  const figure = ratioText(ratio);
  if (setupScaleRatio === null) return { figure, meaning: `${history}.` };
  const { largestScaleRatio } = guideScaleLimit(setupScaleRatio, USUAL_CENTROID_FRACTION_PX);
  const least = ratioText((ratio * setupScaleRatio) / largestScaleRatio);
  return { figure, meaning: `${history}, with these two cameras ${least}.` };
}

/** Two pixels are the sampling theorem's least; above four, common practice calls it more than seeing can fill. */
function sampling(px: number, sensor: SetupEntry['imaging']['sensor']) {
  const verdict =
    px < 2
      ? 'fewer than two blur small guide errors away and make stars blocky'
      : px <= 4
        ? 'between two and four show the shape of a star without spreading its light thin'
        : 'more than four spread the light of a star thin and show no more of its shape';
  const mono = `Pixels across the seeing disc: ${verdict}.`;
  return {
    figure: `${ratioText(px)} px`,
    meaning: sensor === 'mono' ? mono : `${mono} ${oneShotColour(px)}`,
  };
}

function oneShotColour(px: number): string {
  return `With one-shot colour four photosites share the colours of one sample, so red and blue are measured at every second pixel only: ${ratioText(px / 2)} samples across the disc, and the rest is filled in from the neighbours.`;
}
