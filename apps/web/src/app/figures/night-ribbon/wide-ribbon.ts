import { clockText, clockTicks } from '../clock';
import type { KeyPoint } from '../figure-key/figure-key';
import { hatched, line, path, rect, text, type Shape } from '../drawing/shapes';
import { arcsecText, ratioText } from '../measure-text';
import { linearScale, type Scale } from '../scale';
import {
  endMs,
  envelopeColumns,
  subCells,
  type EnvelopeColumn,
  type RibbonRun,
} from './ribbon-night';
import { type RibbonSky, skyNames, skyShapes } from './ribbon-sky';

export interface RibbonView {
  readonly runs: readonly RibbonRun[];
  /** Empty where the site is not known. */
  readonly skies: readonly RibbonSky[];
  readonly selectedId: string | null;
  readonly fromMs: number;
  readonly toMs: number;
  readonly timeZone: string;
  readonly widthPx: number;
}

export interface RibbonDrawing {
  readonly heightPx: number;
  readonly shapes: readonly Shape[];
}

const LEFT_PX = 44;
const TOP_PX = 34;
const BAND_PX = 140;
const CENTRE_PX = TOP_PX + BAND_PX / 2;
const BAND_END_PX = TOP_PX + BAND_PX;
const SUBS_TOP_PX = BAND_END_PX + 66;
const SUBS_PX = 58;
const SUBS_END_PX = SUBS_TOP_PX + SUBS_PX;
const COLUMN_PX = 3;
const SMALLEST_HALF_ARCSEC = 1.75;
const SMALLEST_TOP_ASPECT = 1.3;
const CHARACTER_PX = 7.3;

export function timeScale(view: RibbonView): Scale {
  return linearScale([view.fromMs, view.toMs], [LEFT_PX, view.widthPx]);
}

/** Inside the upper edge of the band. */
export function wideKeyPoint(view: RibbonView, atMs: number): KeyPoint {
  return { xPx: timeScale(view)(atMs), yPx: TOP_PX + 13 };
}

/** Half the height of the band in arcseconds: 1.75″, or more where the night needs it. */
export function halfBandArcsec(columns: readonly EnvelopeColumn[]): number {
  const widest = columns.reduce((most, c) => Math.max(most, c.raArcsec, c.decArcsec), 0);
  return Math.max(SMALLEST_HALF_ARCSEC, Math.ceil(widest * 1.03 * 4) / 4);
}

export function topAspect(runs: readonly RibbonRun[]): number {
  return Math.max(SMALLEST_TOP_ASPECT, ...runs.map((run) => (run.subs?.keepAspect ?? 1) + 0.1));
}

/** Time runs to the right: RA up, Dec down, the sub forecast under it. */
export function wideRibbon(view: RibbonView): RibbonDrawing {
  const x = timeScale(view);
  const stepMs = ((view.toMs - view.fromMs) / (view.widthPx - LEFT_PX)) * COLUMN_PX;
  const envelopes = view.runs.map((run) => envelopeColumns(run, stepMs));
  const halfArcsec = halfBandArcsec(envelopes.flat());
  const pxPerArcsec = BAND_PX / 2 / halfArcsec;
  const withSubs = view.runs.some((run) => run.subs);
  const endPx = withSubs ? SUBS_END_PX : BAND_END_PX + 48;
  return {
    heightPx: endPx + 34,
    shapes: [
      rect(LEFT_PX, TOP_PX, view.widthPx - LEFT_PX, BAND_PX, 'band'),
      ...skyShapes(view.skies, x, { startPx: TOP_PX, sizePx: BAND_PX }, false),
      ...skyNames(view.skies, x, TOP_PX - 18, view.timeZone),
      ...bandScale(view.widthPx, pxPerArcsec, halfArcsec),
      ...view.runs.flatMap((run, i) => [
        ...envelopeShapes(envelopes[i] ?? [], x, pxPerArcsec),
        ...runShapes(run, x, run.id === view.selectedId),
      ]),
      ...runNames(view, x),
      ...(withSubs ? subShapes(view, x) : []),
      ...hourTicks(view, x, endPx),
    ],
  };
}

function bandScale(widthPx: number, pxPerArcsec: number, halfArcsec: number): Shape[] {
  const mark = halfArcsec < 2 ? 1.5 : Math.floor(halfArcsec);
  const label = `${mark}″`;
  const up = CENTRE_PX - mark * pxPerArcsec;
  const down = CENTRE_PX + mark * pxPerArcsec;
  return [
    text(LEFT_PX - 8, up + 4, label, 'axis ra', 'end'),
    text(LEFT_PX - 8, CENTRE_PX + 4, '0', 'axis', 'end'),
    text(LEFT_PX - 8, down + 4, label, 'axis dec', 'end'),
    line(LEFT_PX, up, widthPx, up, 'gridline'),
    line(LEFT_PX, down, widthPx, down, 'gridline'),
    line(LEFT_PX, CENTRE_PX, widthPx, CENTRE_PX, 'base'),
  ];
}

function envelopeShapes(
  columns: readonly EnvelopeColumn[],
  x: Scale,
  pxPerArcsec: number,
): Shape[] {
  const bars = (towards: -1 | 1, size: (column: EnvelopeColumn) => number): string =>
    columns
      .map((column) => {
        const left = Math.round(x(column.fromMs)) + 1;
        const width = Math.max(2, Math.round(x(column.toMs)) - left);
        const tip = (CENTRE_PX + towards * size(column) * pxPerArcsec).toFixed(2);
        return `M${left} ${CENTRE_PX}V${tip}h${width}V${CENTRE_PX}Z`;
      })
      .join('');
  return [
    path(
      bars(-1, (column) => column.raArcsec),
      'ra-fill',
    ),
    path(
      bars(1, (column) => column.decArcsec),
      'dec-fill',
    ),
  ];
}

function runShapes(run: RibbonRun, x: Scale, selected: boolean): Shape[] {
  const left = x(run.startMs);
  const right = x(endMs(run));
  const at = (seconds: number): number => x(run.startMs + seconds * 1000);
  return [
    ...run.setAside
      .filter(({ reason }) => reason === 'star lost' || reason === 'by hand')
      .flatMap(({ fromSeconds, toSeconds }) =>
        hatched(at(fromSeconds), TOP_PX, at(toSeconds) - at(fromSeconds), BAND_PX),
      ),
    line(left, TOP_PX, left, BAND_END_PX, 'ink'),
    line(right, TOP_PX, right, BAND_END_PX, 'ink'),
    ...run.setAside
      .filter(({ reason }) => reason === 'dither')
      .map(({ fromSeconds }) =>
        line(at(fromSeconds), BAND_END_PX + 3, at(fromSeconds), BAND_END_PX + 9, 'ink-2'),
      ),
    ...(selected
      ? [path(`M${left} ${TOP_PX - 4}V${TOP_PX - 8}H${right}V${TOP_PX - 4}`, 'bracket')]
      : []),
  ];
}

/** Name and total under the left edge of a run; where runs are short a name may find no room, the selected one does. */
function runNames(view: RibbonView, x: Scale): Shape[] {
  const taken: { left: number; right: number }[] = [];
  const bySelection = [...view.runs].sort(
    (a, b) => Number(b.id === view.selectedId) - Number(a.id === view.selectedId),
  );
  return bySelection.flatMap((run) => {
    const total = run.totalRmsArcsec === null ? '' : `${arcsecText(run.totalRmsArcsec)} total`;
    const width = CHARACTER_PX * Math.max(run.name.length, total.length);
    const left = Math.min(x(run.startMs) + 1, view.widthPx - width);
    const right = left + width + 10;
    if (taken.some((other) => left < other.right && other.left < right)) return [];
    taken.push({ left, right });
    const look = run.id === view.selectedId ? 'name strong' : 'name';
    return [
      text(left, BAND_END_PX + 27, run.name, look),
      text(left, BAND_END_PX + 43, total, 'axis'),
    ];
  });
}

function subShapes(view: RibbonView, x: Scale): Shape[] {
  const top = topAspect(view.runs);
  const height = linearScale([1, top], [0, SUBS_PX]);
  const cells = view.runs.flatMap(subCells).flatMap((cell) => {
    const left = x(cell.fromMs);
    const width = Math.max(0.8, x(cell.toMs) - left - 1);
    const tall = Math.max(2, height(Math.min(top, cell.aspect)));
    const middle = left + width / 2;
    const foot = SUBS_END_PX;
    const triangle = `M${middle - 2.4} ${foot + 9}L${middle} ${foot + 4.5}L${middle + 2.4} ${foot + 9}Z`;
    return [
      rect(left, foot - tall, width, tall, cell.over ? 'sub-over' : 'sub'),
      ...(cell.over ? [path(triangle, 'sub-over')] : []),
    ];
  });
  const limits = [...new Set(view.runs.flatMap((run) => run.subs?.keepAspect ?? []))];
  return [
    line(LEFT_PX, SUBS_END_PX + 0.5, view.widthPx, SUBS_END_PX + 0.5, 'base'),
    text(LEFT_PX - 8, SUBS_END_PX + 2, '1.0', 'axis', 'end'),
    text(LEFT_PX - 8, SUBS_TOP_PX + 8, top.toFixed(1), 'axis', 'end'),
    ...cells,
    ...limits.flatMap((limit) => {
      const y = SUBS_END_PX - height(limit);
      const label = `keep limit ${ratioText(limit)}`;
      return [
        line(LEFT_PX, y, view.widthPx, y, 'limit'),
        text(view.widthPx, y - 5, label, 'axis mark halo', 'end'),
      ];
    }),
  ];
}

function hourTicks(view: RibbonView, x: Scale, endPx: number): Shape[] {
  const most = Math.floor((view.widthPx - LEFT_PX) / 56);
  return clockTicks(view.fromMs, view.toMs, most, view.timeZone).flatMap((ms) => [
    line(x(ms), endPx + 12, x(ms), endPx + 16, 'base'),
    text(x(ms), endPx + 29, clockText(ms, view.timeZone), 'axis', 'middle'),
  ]);
}
