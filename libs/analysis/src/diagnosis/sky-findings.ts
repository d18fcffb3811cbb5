import {
  type Draft,
  type FindingContext,
  gainIfCured,
  gravest,
  type MeasuredRun,
  partOf,
  partSeverity,
  severityOf,
} from './finding-context';
import { arcsec, percent } from './numbers-in-words';
import { THRESHOLDS } from './thresholds';

/** Gusts, bumps, cables. */
export function gustFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  const ra = partOf(run, 'ra', 'gusts and bumps');
  const dec = partOf(run, 'dec', 'gusts and bumps');
  if (ra === null || dec === null) return [];
  const severity = gravest(partSeverity(ra, context), partSeverity(dec, context));
  if (severity === 'fine') return [];
  const rms = Math.hypot(ra.rmsArcsec, dec.rmsArcsec);
  return [
    {
      axis: null,
      onMount: false,
      code: 'gusts',
      severity,
      sentence: `Gusts and bumps cost ${arcsec(rms)} RMS.`,
      evidence: [
        `${percent(ra.share)} of RA, ${percent(dec.share)} of Dec, in a few frames that stand out.`,
      ],
      nextStep: 'Free the cables of both axes, and shield tube and tripod from the wind.',
      gain: gainIfCured(run, context, { ra: ra.rmsArcsec ** 2, dec: dec.rmsArcsec ** 2 }),
      caution:
        'Switch the power off before reaching between moving parts; mains leads outdoors stay out of the dew.',
    },
  ];
}

/** Frames without a star. */
export function starLostFindings(run: MeasuredRun): Draft[] {
  const lost = run.setAside
    .filter(({ reason }) => reason === 'star lost')
    .reduce((frames, range) => frames + range.frames, 0);
  const part = run.frames === 0 ? 0 : lost / run.frames;
  const severity = severityOf(part, THRESHOLDS.starLost);
  if (severity === 'fine') return [];
  return [
    {
      axis: null,
      onMount: false,
      code: 'star-lost',
      severity,
      sentence: `The guide star was lost in ${percent(part)} of the frames.`,
      evidence: [`${lost} of ${run.frames} frames.`],
      nextStep: 'Check for cloud and dew, and choose a brighter guide star.',
      gain: null,
      caution: null,
    },
  ];
}

/** Part of both axes' variance that the seeing floor takes; null without a budget. */
export function floorShare(run: MeasuredRun): number | null {
  const ra = partOf(run, 'ra', 'seeing floor');
  const dec = partOf(run, 'dec', 'seeing floor');
  if (ra === null || dec === null || run.total === null || run.total.rmsArcsec === 0) return null;
  return (ra.rmsArcsec ** 2 + dec.rmsArcsec ** 2) / run.total.rmsArcsec ** 2;
}

/**
 * A night on which the sky set the limit.
 *
 * @param mountIsClear Whether no finding asks for work on the mount.
 */
export function seeingFindings(run: MeasuredRun, mountIsClear: boolean): Draft[] {
  const share = floorShare(run);
  if (share === null || run.total === null || share < THRESHOLDS.floorShare.watch) return [];
  const { rmsArcsec } = run.total;
  return [
    {
      axis: null,
      onMount: false,
      code: 'seeing-limited',
      severity: 'fine',
      sentence: `Seeing limited this run: ${arcsec(Math.sqrt(share) * rmsArcsec)} of the ${arcsec(rmsArcsec)} RMS.`,
      evidence: [`${percent(share)} of the variance changes from frame to frame.`],
      nextStep: mountIsClear
        ? 'Leave the mount alone: nothing in it is worth a screwdriver tonight.'
        : 'Look again after a night of better seeing before working on the mount.',
      gain: null,
      caution: null,
    },
  ];
}
