import type { CustomSeriesOption, LineSeriesOption } from 'echarts/charts';
import type { DataZoomComponentOption, GridComponentOption } from 'echarts/components';
import type { ComposeOption } from 'echarts/core';
import type { CanvasColours } from '../token-colours';
import type { TraceColumns, TraceSegment } from './trace-columns';
import type { SecondsRange } from './trace-stretch';

export type TraceOption = ComposeOption<
  CustomSeriesOption | LineSeriesOption | GridComponentOption | DataZoomComponentOption
>;
type RenderItem = NonNullable<CustomSeriesOption['renderItem']>;

export const LEFT_PX = 44;
export const RIGHT_PX = 4;
const TOP_PX = 8;
const STRIP_PX = 104;
const GAP_PX = 16;
const STRIPS = [
  { axis: 'ra', name: 'RA', topPx: TOP_PX },
  { axis: 'dec', name: 'Dec', topPx: TOP_PX + STRIP_PX + GAP_PX },
] as const;
export const stripTopPx = (axis: 'ra' | 'dec'): number =>
  STRIPS.find((strip) => strip.axis === axis)?.topPx ?? TOP_PX;
export const BOTTOM_PX = TOP_PX + 2 * STRIP_PX + GAP_PX;
export const HEIGHT_PX = BOTTOM_PX + 26;
const NARROWEST_HATCH_PX = 3.2;
const SHORTEST_SIGHT_SECONDS = 20;

export interface TraceFrame {
  readonly colours: CanvasColours;
  readonly durationSeconds: number;
  readonly halfRangeArcsec: number;
}

export interface TraceContent extends TraceFrame {
  readonly columns: TraceColumns;
  readonly setAside: readonly SecondsRange[];
  readonly ticks: readonly { readonly seconds: number; readonly text: string }[];
}

/** Axes and zoom: set once for a run and a theme, so that a zoom in progress is not cut off. */
export function traceFrame({ colours, durationSeconds, halfRangeArcsec }: TraceFrame): TraceOption {
  const step = halfRangeArcsec > 5 ? Math.ceil(halfRangeArcsec / 3) : halfRangeArcsec > 2 ? 2 : 1;
  const label = { fontFamily: 'Roboto Mono', fontSize: 12 };
  return {
    animation: false,
    grid: STRIPS.map(({ topPx }) => ({
      left: LEFT_PX,
      right: RIGHT_PX,
      top: topPx,
      height: STRIP_PX,
    })),
    xAxis: STRIPS.map(({ axis }, gridIndex) => ({
      type: 'value' as const,
      gridIndex,
      min: 0,
      max: durationSeconds,
      axisLine: { show: false, onZero: false },
      axisTick: { show: axis === 'dec', lineStyle: { color: colours.ruleStrong } },
      axisLabel: { ...label, show: axis === 'dec', color: colours.ink2, margin: 8 },
      splitLine: { show: false },
    })),
    yAxis: STRIPS.map(({ name }, gridIndex) => ({
      type: 'value' as const,
      gridIndex,
      min: -halfRangeArcsec,
      max: halfRangeArcsec,
      interval: step,
      axisLine: { show: false },
      axisTick: { show: false },
      axisLabel: {
        ...label,
        customValues: [-step, 0, step],
        color: colours.ink2,
        formatter: (value: number) =>
          value === 0 ? name : `${value > 0 ? '+' : '\u2212'}${Math.abs(value)}″`,
      },
      splitLine: { show: false },
    })),
    dataZoom: [
      {
        type: 'inside',
        xAxisIndex: [0, 1],
        filterMode: 'none',
        zoomOnMouseWheel: 'ctrl',
        moveOnMouseWheel: false,
        minValueSpan: Math.min(SHORTEST_SIGHT_SECONDS, durationSeconds),
        throttle: 40,
      },
    ],
    series: [],
  };
}

/** What stands in the frame, for the stretch in sight. */
export function traceContent(content: TraceContent): TraceOption {
  const { colours, columns, ticks } = content;
  const customValues = ticks.map((tick) => tick.seconds);
  const texts = new Map(ticks.map((tick) => [tick.seconds, tick.text]));
  return {
    xAxis: STRIPS.map(() => ({
      axisTick: { customValues },
      axisLabel: {
        customValues,
        hideOverlap: true,
        formatter: (seconds: number) => texts.get(seconds) ?? '',
      },
    })),
    series: STRIPS.flatMap(({ axis }, index) => {
      const segments = columns[axis];
      const tint = axis === 'ra' ? colours.raTint : colours.decTint;
      const line = axis === 'ra' ? colours.ra : colours.dec;
      const dash = axis === 'dec' && colours.decDash.length > 0 ? [...colours.decDash] : 'solid';
      const place = { xAxisIndex: index, yAxisIndex: index, silent: true } as const;
      return [
        custom(`${axis} grid`, place, [[0, 0]], gridLines(content)),
        custom(`${axis} extent`, place, starts(segments), extentOf(segments, tint, columns)),
        {
          id: `${axis} mean`,
          type: 'line' as const,
          ...place,
          clip: true,
          data: segments.flatMap((segment) => [
            ...segment.map((column) => [column.seconds, column.meanArcsec]),
            [segment.at(-1)?.seconds ?? 0, null],
          ]),
          symbol: 'circle',
          symbolSize: 4,
          showSymbol: columns.stepSeconds === 0,
          lineStyle: { color: line, width: 1.4, type: dash },
          color: line,
        },
        custom(
          `${axis} set aside`,
          place,
          content.setAside.map((range) => [range.fromSeconds, range.toSeconds]),
          hatched(content),
        ),
        custom(`${axis} beyond`, place, beyond(segments, content), triangle(line)),
      ];
    }),
  };
}

function custom(
  id: string,
  place: object,
  data: number[][],
  renderItem: RenderItem,
): CustomSeriesOption {
  return { id, type: 'custom', ...place, clip: true, data, renderItem };
}

function gridLines({ colours, halfRangeArcsec, durationSeconds }: TraceContent): RenderItem {
  return (_params, api) => {
    const levels: number[] = [];
    for (let level = 1; level <= halfRangeArcsec; level += halfRangeArcsec > 5 ? 5 : 1) {
      levels.push(level, -level);
    }
    return {
      type: 'group',
      children: [0, ...levels].map((arcsec) => {
        const [, y = 0] = api.coord([0, arcsec]);
        const width = api.size?.([durationSeconds, 0]);
        const [x = 0] = api.coord([0, 0]);
        return {
          type: 'line' as const,
          shape: { x1: x, x2: x + (Array.isArray(width) ? (width[0] ?? 0) : 0), y1: y, y2: y },
          style: {
            stroke: colours.ruleStrong,
            lineWidth: 1,
            ...(arcsec === 0 ? {} : { lineDash: [1, 3] }),
          },
        };
      }),
    };
  };
}

const starts = (segments: readonly TraceSegment[]): number[][] =>
  segments.map((segment) => [segment[0]?.seconds ?? 0, segment[0]?.meanArcsec ?? 0]);

/** A band from the least to the greatest of each column; single frames have none. */
function extentOf(
  segments: readonly TraceSegment[],
  fill: string,
  { stepSeconds }: TraceColumns,
): RenderItem {
  return ({ dataIndex }, api) => {
    const segment = segments[dataIndex] ?? [];
    const half = stepSeconds / 2;
    const upper = segment.flatMap((column) => [
      api.coord([column.seconds - half, column.greatestArcsec]),
      api.coord([column.seconds + half, column.greatestArcsec]),
    ]);
    const lower = segment.flatMap((column) => [
      api.coord([column.seconds - half, column.leastArcsec]),
      api.coord([column.seconds + half, column.leastArcsec]),
    ]);
    return {
      type: 'polygon',
      shape: { points: [...upper, ...lower.reverse()] },
      style: { fill },
    };
  };
}

function hatched({ colours, halfRangeArcsec }: TraceContent): RenderItem {
  const pattern = hatchPattern(colours);
  return (_params, api) => {
    const [left = 0, top = 0] = api.coord([api.value(0), halfRangeArcsec]);
    const [right = 0, bottom = 0] = api.coord([api.value(1), -halfRangeArcsec]);
    const shape = {
      x: left,
      y: top,
      width: Math.max(NARROWEST_HATCH_PX, right - left),
      height: bottom - top,
    };
    return { type: 'rect', shape, style: { fill: pattern } };
  };
}

/** Lines at 45° every 5 px over paper; plain paper where there is no canvas to draw them on. */
function hatchPattern(colours: CanvasColours) {
  const tile = document.createElement('canvas');
  tile.width = 10;
  tile.height = 10;
  const context = tile.getContext('2d');
  if (!context) return colours.paper;
  context.fillStyle = colours.paper;
  context.fillRect(0, 0, 10, 10);
  context.fillStyle = colours.hatch;
  context.fillRect(0, 0, 1.3, 10);
  context.fillRect(5, 0, 1.3, 10);
  return { image: tile, repeat: 'repeat' as const, rotation: Math.PI / 4 };
}

/** Places at the edge for values that the frame cannot hold: seconds, edge, +1 above or −1 below. */
function beyond(segments: readonly TraceSegment[], { halfRangeArcsec }: TraceFrame): number[][] {
  return segments
    .flat()
    .flatMap((column) => [
      ...(column.greatestArcsec > halfRangeArcsec ? [[column.seconds, halfRangeArcsec, 1]] : []),
      ...(column.leastArcsec < -halfRangeArcsec ? [[column.seconds, -halfRangeArcsec, -1]] : []),
    ]);
}

function triangle(stroke: string): RenderItem {
  return (_params, api) => {
    const [x = 0, y = 0] = api.coord([api.value(0), api.value(1)]);
    const down = Number(api.value(2)); // +1: the tip points up, away from the frame's middle
    const points = [
      [x - 4, y + down * 8],
      [x, y + down * 1],
      [x + 4, y + down * 8],
    ];
    return { type: 'polygon', shape: { points }, style: { fill: 'none', stroke, lineWidth: 1.2 } };
  };
}
