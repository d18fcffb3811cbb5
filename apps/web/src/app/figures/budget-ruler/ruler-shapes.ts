import { line, path, rect, text, type Shape } from '../drawing/shapes';
import type { KeyPoint } from '../figure-key/figure-key';
import { arcsecText } from '../measure-text';
import {
  fillOf,
  linesOf,
  PART_ORDER,
  placeParts,
  type Axis,
  type AxisBudget,
  type PartName,
  type PlacedPart,
} from './budget-parts';

const LEFT_PX = 118;
const RULER_PX = 26;
const RA_TOP_PX = 126;
const DEC_TOP_PX = 176;
export const FACING_HEIGHT_PX = 284;
export const SINGLE_HEIGHT_PX = 46;

/** Two facing rulers with one scale between them, and a column of values for each part. */
export function facingRulers(ra: AxisBudget, dec: AxisBudget, widthPx: number): Shape[] {
  const columnPx = (widthPx - LEFT_PX - 2) / PART_ORDER.length;
  return [
    ...PART_ORDER.flatMap((name, i) =>
      linesOf(name).map((words, row) => text(LEFT_PX + i * columnPx, 13 + row * 17, words, 'name')),
    ),
    ...ruler('ra', ra, widthPx, columnPx),
    ...ruler('dec', dec, widthPx, columnPx),
    ...sharedScale(widthPx),
  ];
}

/** To the right of the size of a part. */
export function facingKeyPoint(
  { axis, part }: { readonly axis: Axis; readonly part: PartName },
  widthPx: number,
): KeyPoint {
  const columnPx = (widthPx - LEFT_PX - 2) / PART_ORDER.length;
  const value = axis === 'ra' ? 60 : 260;
  return { xPx: LEFT_PX + PART_ORDER.indexOf(part) * columnPx + 62, yPx: value - 5 };
}

function ruler(axis: Axis, budget: AxisBudget, widthPx: number, columnPx: number): Shape[] {
  const above = axis === 'ra';
  const top = above ? RA_TOP_PX : DEC_TOP_PX;
  const lengthPx = widthPx - LEFT_PX - 2;
  const parts = placeParts(budget);
  return [
    text(0, top + 12, above ? 'RA' : 'Dec', `axis-name ${axis}`),
    text(0, top + 28, `${arcsecText(budget.rmsAboutLockArcsec)} RMS`, 'axis strong'),
    ...parts.flatMap((part) =>
      partShapes(part, axis, LEFT_PX + part.from * lengthPx, top, part.share * lengthPx, RULER_PX),
    ),
    ...parts.flatMap((part, i) => {
      const column = LEFT_PX + i * columnPx;
      const value = above ? 60 : 260;
      if (!part.seen) return [text(column, value, 'none seen', 'axis')];
      const middle = LEFT_PX + (part.from + part.share / 2) * lengthPx;
      return [
        path(leader(column, middle, above), 'leader'),
        text(column, value, arcsecText(part.rmsArcsec), 'value'),
        text(column, value + 17, `leaves ${arcsecText(part.rmsIfCuredArcsec)}`, 'axis'),
      ];
    }),
  ];
}

function leader(columnPx: number, middlePx: number, above: boolean): string {
  return above
    ? `M${columnPx + 0.5} 86V94L${middlePx} 120V126`
    : `M${columnPx + 0.5} 242V234L${middlePx} 208V202`;
}

function partShapes(
  part: PlacedPart,
  axis: Axis,
  x: number,
  y: number,
  width: number,
  height: number,
): Shape[] {
  if (!part.seen) return [];
  const { look, pattern } = fillOf(part.name, axis);
  const filled = rect(x, y, width, height, look);
  return [
    pattern ? { ...filled, pattern } : filled,
    ...(width > 2 ? [rect(x, y, width, height, `${axis}-outline`)] : []),
  ];
}

function sharedScale(widthPx: number): Shape[] {
  const lengthPx = widthPx - LEFT_PX - 2;
  const top = RA_TOP_PX + RULER_PX;
  return Array.from({ length: 51 }, (_, i) => i * 2).flatMap((percent) => {
    const x = LEFT_PX + (percent / 100) * lengthPx;
    const tick = percent % 10 === 0 ? 6 : 3;
    return [
      line(x, top, x, top + tick, 'ink'),
      line(x, DEC_TOP_PX, x, DEC_TOP_PX - tick, 'ink'),
      ...(percent % 20 === 0 ? [percentLabel(percent, x, top + 16.2)] : []),
    ];
  });
}

function percentLabel(percent: number, x: number, y: number): Shape {
  const anchor = percent === 0 ? 'start' : percent === 100 ? 'end' : 'middle';
  return text(x, y, percent === 100 ? '100 %' : `${percent}`, 'axis', anchor);
}

/** One ruler with its scale, for narrow screens. */
export function singleRuler(axis: Axis, budget: AxisBudget, widthPx: number): Shape[] {
  const lengthPx = widthPx - 1;
  return [
    ...placeParts(budget).flatMap((part) =>
      partShapes(part, axis, 0.5 + part.from * lengthPx, 0.5, part.share * lengthPx, 24),
    ),
    ...Array.from({ length: 21 }, (_, i) => i * 5).flatMap((percent) => {
      const x = 0.5 + (percent / 100) * lengthPx;
      return [
        line(x, 24, x, percent % 10 === 0 ? 30 : 27, 'ink'),
        ...(percent % 20 === 0 ? [percentLabel(percent, x, 42)] : []),
      ];
    }),
  ];
}

/** The fill of a part as a small sample beside its name. */
export function swatch(part: PlacedPart, axis: Axis): Shape[] {
  return partShapes({ ...part, seen: true }, axis, 0.5, 0.5, 13, 11);
}
