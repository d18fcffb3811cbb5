import type { PatternName } from '../drawing/shapes';

export type Axis = 'ra' | 'dec';

export interface BudgetPart {
  readonly part: string;
  /** Of the axis' mean square about the lock position, 0 to 1. */
  readonly share: number;
  readonly rmsArcsec: number;
  readonly rmsIfCuredArcsec: number;
}

export interface AxisBudget {
  readonly rmsAboutLockArcsec: number;
  readonly parts: readonly BudgetPart[];
}

/** From the left: always the same, so that leaders never cross. */
export const PART_ORDER = [
  'periodic error',
  'drift',
  'backlash',
  'over-correction',
  'gusts and bumps',
  'seeing floor',
  'unexplained',
] as const;
export type PartName = (typeof PART_ORDER)[number];

const NONE_SEEN_BELOW = 0.0035;

export interface PlacedPart {
  readonly name: PartName;
  readonly seen: boolean;
  readonly from: number;
  readonly share: number;
  readonly rmsArcsec: number;
  readonly rmsIfCuredArcsec: number;
}

/** The parts in their fixed order, each with the share at which it begins. */
export function placeParts(budget: AxisBudget): PlacedPart[] {
  let from = 0;
  return PART_ORDER.map((name) => {
    const found = budget.parts.find((each) => each.part === name);
    const share = found?.share ?? 0;
    const placed = {
      name,
      seen: share >= NONE_SEEN_BELOW,
      from,
      share,
      rmsArcsec: found?.rmsArcsec ?? 0,
      rmsIfCuredArcsec: found?.rmsIfCuredArcsec ?? budget.rmsAboutLockArcsec,
    };
    from += share;
    return placed;
  });
}

/** How a part is filled: a solid or a tint of its axis, or a pattern over the tint. */
export function fillOf(name: PartName, axis: Axis): { look: string; pattern: PatternName | null } {
  switch (name) {
    case 'periodic error':
      return { look: `${axis}-fill`, pattern: null };
    case 'seeing floor':
      return { look: `${axis}-tint`, pattern: null };
    case 'unexplained':
      return { look: 'paper', pattern: null };
    case 'drift':
      return { look: 'patterned', pattern: `lines-${axis}` };
    case 'backlash':
      return { look: 'patterned', pattern: `uprights-${axis}` };
    case 'over-correction':
      return { look: 'patterned', pattern: `dots-${axis}` };
    case 'gusts and bumps':
      return { look: 'patterned', pattern: `chevrons-${axis}` };
  }
}

const NAMES_IN_TWO_LINES: Record<PartName, readonly [string, string]> = {
  'periodic error': ['Periodic', 'error'],
  drift: ['Drift', ''],
  backlash: ['Backlash and', 'reversals'],
  'over-correction': ['Over-', 'correction'],
  'gusts and bumps': ['Gusts and', 'bumps'],
  'seeing floor': ['Seeing', 'floor'],
  unexplained: ['Unexplained', ''],
};

export function linesOf(name: PartName): readonly [string, string] {
  return NAMES_IN_TWO_LINES[name];
}

export function titleOf(name: PartName): string {
  const [first, second] = NAMES_IN_TWO_LINES[name];
  const joined = first.endsWith('-') ? `${first}${second}` : `${first} ${second}`;
  return joined.trim();
}
