import { type Finding } from '../analysis-document';
import { rigWormPeriodSeconds } from '../spectrum/gear-periods';
import { backlashFindings, stictionFindings } from './backlash-findings';
import {
  type Draft,
  type FindingContext,
  type MeasuredRun,
  mildest,
  partOf,
} from './finding-context';
import {
  asymmetryFindings,
  overCorrectionFindings,
  responseOffFindings,
  underCorrectionFindings,
} from './loop-findings';
import { correlationFindings, guideScaleFindings, samplingFindings } from './optics-findings';
import { lineFindings, periodicErrorFindings } from './periodic-findings';
import { driftFindings, polarFindings } from './polar-findings';
import { floorShare, gustFindings, seeingFindings, starLostFindings } from './sky-findings';
import { SHORTEST_RUN_SECONDS, THRESHOLDS } from './thresholds';

const GRAVEST_FIRST: readonly Finding['severity'][] = ['act', 'watch', 'fine'];

/**
 * What limited a run and what to do, worst first; among equals what would gain most. Where the seeing floor dominates no
 * finding about the mount is graver than 'watch'. A run that is not analysed has none.
 */
export function findFindings(run: MeasuredRun, context: FindingContext): Finding[] {
  if (run.total === null) return [];
  const short = tooShort(run, context);
  const withoutSeeing = [
    ...periodicErrorFindings(run, context),
    ...lineFindings(run, context),
    ...driftFindings(run, context),
    ...polarFindings(run, context),
    ...backlashFindings(run, context),
    ...stictionFindings(run, context),
    ...overCorrectionFindings(run, context),
    ...underCorrectionFindings(run, context),
    ...asymmetryFindings(run),
    ...responseOffFindings(run),
    ...gustFindings(run, context),
    ...starLostFindings(run),
    ...guideScaleFindings(context),
    ...samplingFindings(context),
    ...correlationFindings(run),
  ].map((draft) => heldBySky(draft, run, short.length > 0));
  const mountIsClear = withoutSeeing.every(
    ({ onMount, severity }) => !onMount || severity === 'fine',
  );
  const found = [...withoutSeeing, ...seeingFindings(run, mountIsClear), ...short];
  return (found.length === 0 ? nothingFound(run.total.rmsArcsec) : found)
    .sort((a, b) => rank(a) - rank(b) || cured(a) - cured(b))
    .map(({ code, severity, sentence, evidence, nextStep, gain, caution }) => ({
      code,
      severity,
      sentence,
      evidence,
      nextStep,
      gain,
      caution,
    }));
}

const rank = (draft: Draft) => GRAVEST_FIRST.indexOf(draft.severity);
const cured = (draft: Draft) => draft.gain?.rmsIfCuredArcsec ?? Infinity;

/** Nothing about the mount shouts when the sky dominates; a short run tells nothing for sure but a lost star. */
function heldBySky(draft: Draft, run: MeasuredRun, isShort: boolean): Draft {
  if (isShort && draft.code !== 'star-lost') {
    return { ...draft, severity: mildest(draft.severity, 'watch') };
  }
  if (!draft.onMount) return draft;
  const { watch: ofAxis, act: ofBoth } = THRESHOLDS.floorShare;
  const own = draft.axis === null ? null : partOf(run, draft.axis, 'seeing floor');
  const dominates = (own?.share ?? 0) > ofAxis || (floorShare(run) ?? 0) > ofBoth;
  return dominates ? { ...draft, severity: mildest(draft.severity, 'watch') } : draft;
}

function tooShort(run: MeasuredRun, { rig }: FindingContext): Draft[] {
  const worm = rigWormPeriodSeconds(rig);
  const needed = Math.max(SHORTEST_RUN_SECONDS, worm === null ? 0 : 2 * worm);
  if (run.durationSeconds >= needed) return [];
  const minutes = (seconds: number) => Math.ceil(seconds / 60);
  return [
    {
      axis: null,
      onMount: false,
      code: 'too-short',
      severity: 'fine',
      sentence: `This run of ${Math.round(run.durationSeconds / 60)} minutes is too short to tell the mount.`,
      evidence: [
        worm === null
          ? `${minutes(needed)} minutes are needed.`
          : `${minutes(needed)} minutes are needed: two worm turns, and ten at least.`,
      ],
      nextStep: 'Guide one target for longer before changing anything.',
      gain: null,
      caution: null,
    },
  ];
}

function nothingFound(rmsArcsec: number): Draft[] {
  return [
    {
      axis: null,
      onMount: false,
      code: 'nothing-found',
      severity: 'fine',
      sentence: `Nothing stands out in this run of ${rmsArcsec.toFixed(2)}″ RMS.`,
      evidence: [],
      nextStep: 'Keep everything as it is.',
      gain: null,
      caution: null,
    },
  ];
}
