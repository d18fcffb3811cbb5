import type { Finding } from '@stillpier/contract';

/** What a finding is called in lists, and the figure that it speaks about. */
export const FINDING_NAMES: Record<Finding['code'], string> = {
  'periodic-error': 'periodic error',
  'gear-line': 'gear period',
  'unnamed-line': 'unnamed period',
  drift: 'drift',
  'polar-alignment': 'polar alignment',
  backlash: 'backlash',
  stiction: 'stiction',
  'over-correction': 'over-correction',
  'under-correction': 'under-correction',
  'response-asymmetry': 'uneven response',
  'response-off': 'response off',
  gusts: 'gusts and bumps',
  'star-lost': 'star lost',
  'seeing-limited': 'seeing',
  'guide-scale-coarse': 'guide scale',
  sampling: 'sampling',
  'axes-correlated': 'axes move together',
  'too-short': 'too short',
  'nothing-found': 'nothing found',
};

export const FIGURES = ['night', 'star', 'budget', 'trace', 'spectrum', 'worm', 'mount'] as const;
export type Figure = (typeof FIGURES)[number];

const FIGURE_OF: Record<Finding['code'], Figure> = {
  'star-lost': 'night',
  'too-short': 'night',
  'nothing-found': 'night',
  'seeing-limited': 'star',
  'guide-scale-coarse': 'star',
  sampling: 'star',
  'axes-correlated': 'star',
  'over-correction': 'budget',
  'under-correction': 'budget',
  gusts: 'trace',
  'gear-line': 'spectrum',
  'unnamed-line': 'spectrum',
  'periodic-error': 'worm',
  drift: 'mount',
  'polar-alignment': 'mount',
  backlash: 'mount',
  stiction: 'mount',
  'response-asymmetry': 'mount',
  'response-off': 'mount',
};

export function figureOf(finding: Finding): Figure {
  return FIGURE_OF[finding.code];
}
