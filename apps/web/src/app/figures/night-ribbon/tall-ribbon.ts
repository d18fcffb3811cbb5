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
import { skyShapes } from './ribbon-sky';
import { halfBandArcsec, topAspect, type RibbonDrawing, type RibbonView } from './wide-ribbon';

const LEFT_PX = 46;
const CENTRE_PX = 116;
const HALF_BAND_PX = 60;
const SUBS_LEFT_PX = 196;
const SUBS_PX = 84;
const TOP_PX = 28;
const PX_PER_HOUR = 46;
const LEAST_PX = 260;
const ROW_PX = 3;
const NAME_PX = 38;

export function tallTimeScale(view: RibbonView): Scale {
  const hours = (view.toMs - view.fromMs) / 3_600_000;
  const length = Math.max(LEAST_PX, hours * PX_PER_HOUR);
  return linearScale([view.fromMs, view.toMs], [TOP_PX, TOP_PX + length]);
}

/** Inside the left edge of the band. */
export function tallKeyPoint(view: RibbonView, atMs: number): KeyPoint {
  return { xPx: LEFT_PX + 13, yPx: tallTimeScale(view)(atMs) + 11 };
}

/** For narrow screens time runs down: RA to the left, Dec to the right, subs as bars beside them. */
export function tallRibbon(view: RibbonView): RibbonDrawing {
  const y = tallTimeScale(view);
  const endPx = y(view.toMs);
  const stepMs = ((view.toMs - view.fromMs) / (endPx - TOP_PX)) * ROW_PX;
  const envelopes = view.runs.map((run) => envelopeColumns(run, stepMs));
  const pxPerArcsec = HALF_BAND_PX / halfBandArcsec(envelopes.flat());
  const top = topAspect(view.runs);
  return {
    heightPx: endPx + 10,
    shapes: [
      ...skyShapes(view.skies, y, { startPx: LEFT_PX, sizePx: 2 * (CENTRE_PX - LEFT_PX) }, true),
      ...heads(view),
      ...clockTicks(view.fromMs, view.toMs, (endPx - TOP_PX) / 40, view.timeZone).flatMap((ms) => [
        text(LEFT_PX - 8, y(ms) + 4, clockText(ms, view.timeZone), 'axis', 'end'),
        line(LEFT_PX - 4, y(ms), LEFT_PX, y(ms), 'base'),
      ]),
      line(CENTRE_PX, TOP_PX, CENTRE_PX, endPx, 'base'),
      ...view.runs.flatMap((run, i) => [
        ...envelopeShapes(envelopes[i] ?? [], y, pxPerArcsec),
        ...runShapes(run, y, view),
        ...subShapes(run, y, top),
      ]),
      ...runNames(view, y),
      ...limitShapes(view, top, endPx),
    ],
  };
}

function heads(view: RibbonView): Shape[] {
  return [
    text(CENTRE_PX - 6, 14, 'RA', 'axis ra', 'end'),
    text(CENTRE_PX + 6, 14, 'Dec', 'axis dec'),
    ...(view.runs.some((run) => run.subs) ? [text(SUBS_LEFT_PX, 14, 'aspect', 'axis')] : []),
  ];
}

function envelopeShapes(
  columns: readonly EnvelopeColumn[],
  y: Scale,
  pxPerArcsec: number,
): Shape[] {
  const bars = (towards: -1 | 1, size: (column: EnvelopeColumn) => number): string =>
    columns
      .map((column) => {
        const tip = (CENTRE_PX + towards * size(column) * pxPerArcsec).toFixed(2);
        return `M${CENTRE_PX} ${y(column.fromMs).toFixed(2)}H${tip}V${y(column.toMs).toFixed(2)}H${CENTRE_PX}Z`;
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

function runShapes(run: RibbonRun, y: Scale, view: RibbonView): Shape[] {
  const from = y(run.startMs);
  const to = y(endMs(run));
  const at = (seconds: number): number => y(run.startMs + seconds * 1000);
  const selected = run.id === view.selectedId;
  return [
    ...run.setAside
      .filter(({ reason }) => reason === 'star lost' || reason === 'by hand')
      .flatMap(({ fromSeconds, toSeconds }) =>
        hatched(LEFT_PX, at(fromSeconds), 2 * HALF_BAND_PX, at(toSeconds) - at(fromSeconds)),
      ),
    ...run.setAside
      .filter(({ reason }) => reason === 'dither')
      .map(({ fromSeconds }) =>
        line(
          CENTRE_PX + HALF_BAND_PX,
          at(fromSeconds),
          CENTRE_PX + HALF_BAND_PX + 6,
          at(fromSeconds),
          'ink-2',
        ),
      ),
    line(LEFT_PX, from, view.widthPx, from, 'ink'),
    line(LEFT_PX, to, SUBS_LEFT_PX + SUBS_PX, to, 'ink'),
    ...(selected ? [path(`M${LEFT_PX + 4} ${from}H${LEFT_PX}V${to}h4`, 'bracket')] : []),
  ];
}

/** Under the upper edge of a run; where runs are short a name may find no room, the selected one does. */
function runNames(view: RibbonView, y: Scale): Shape[] {
  const taken: number[] = [];
  const bySelection = [...view.runs].sort(
    (a, b) => Number(b.id === view.selectedId) - Number(a.id === view.selectedId),
  );
  return bySelection.flatMap((run) => {
    const from = y(run.startMs);
    if (taken.some((other) => Math.abs(other - from) < NAME_PX)) return [];
    taken.push(from);
    const look = run.id === view.selectedId ? 'name strong halo' : 'name halo';
    return [
      text(view.widthPx, from + 17, run.name, look, 'end'),
      ...(run.totalRmsArcsec === null
        ? []
        : [text(view.widthPx, from + 34, arcsecText(run.totalRmsArcsec), 'axis halo', 'end')]),
    ];
  });
}

function subShapes(run: RibbonRun, y: Scale, top: number): Shape[] {
  const width = linearScale([1, top], [0, SUBS_PX]);
  return subCells(run).map((cell) =>
    rect(
      SUBS_LEFT_PX,
      y(cell.fromMs),
      Math.max(2, width(Math.min(top, cell.aspect))),
      Math.max(0.6, y(cell.toMs) - y(cell.fromMs) - 1),
      cell.over ? 'sub-over' : 'sub',
    ),
  );
}

function limitShapes(view: RibbonView, top: number, endPx: number): Shape[] {
  const x = linearScale([1, top], [SUBS_LEFT_PX, SUBS_LEFT_PX + SUBS_PX]);
  const limits = [...new Set(view.runs.flatMap((run) => run.subs?.keepAspect ?? []))];
  return limits.flatMap((limit) => [
    line(x(limit), TOP_PX, x(limit), endPx, 'limit'),
    text(x(limit) + 8, 14, ratioText(limit), 'axis mark'),
  ]);
}
