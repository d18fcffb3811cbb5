import type { LineSeriesOption } from 'echarts/charts';
import type { GridComponentOption } from 'echarts/components';
import type { ComposeOption } from 'echarts/core';
import { logTicks } from '../scale';
import type { CanvasColours } from '../token-colours';
import type { AmplitudeCurve } from './peak-hold';

export type SpectrumOption = ComposeOption<LineSeriesOption | GridComponentOption>;

export const LEFT_PX = 44;
export const RIGHT_PX = 12;
export const TOP_PX = 8;
export const PLOT_PX = 176;
export const HEIGHT_PX = TOP_PX + PLOT_PX + 28;

export interface SpectrumFrame {
  readonly fromSeconds: number;
  readonly toSeconds: number;
  readonly topArcsec: number;
  readonly stepArcsec: number;
}

export function spectrumOptions(
  curve: AmplitudeCurve,
  frame: SpectrumFrame,
  colours: CanvasColours,
): SpectrumOption {
  const label = { fontFamily: 'Roboto Mono', fontSize: 12, color: colours.ink2 };
  const ticks = logTicks(frame.fromSeconds, frame.toSeconds);
  const line = (id: string, amplitudes: readonly number[]) => ({
    id,
    type: 'line' as const,
    silent: true,
    showSymbol: false,
    data: curve.periodSeconds.map((period, i) => [period, amplitudes[i] ?? 0]),
  });
  return {
    animation: false,
    grid: { left: LEFT_PX, right: RIGHT_PX, top: TOP_PX, height: PLOT_PX },
    xAxis: {
      type: 'log',
      min: frame.fromSeconds,
      max: frame.toSeconds,
      axisLine: { lineStyle: { color: colours.ruleStrong } },
      axisTick: { customValues: ticks, lineStyle: { color: colours.ruleStrong } },
      axisLabel: {
        ...label,
        customValues: ticks,
        hideOverlap: true,
        formatter: (seconds: number) => (seconds === ticks.at(-1) ? `${seconds} s` : `${seconds}`),
      },
      splitLine: { show: false },
    },
    yAxis: {
      type: 'value',
      min: 0,
      max: frame.topArcsec,
      interval: frame.stepArcsec,
      axisLine: { show: false },
      axisTick: { show: false },
      axisLabel: {
        ...label,
        formatter: (arcsec: number) => (arcsec === 0 ? '0' : `${Number(arcsec.toPrecision(2))}″`),
      },
      splitLine: { lineStyle: { color: colours.ruleStrong, type: [1, 3] } },
    },
    series: [
      {
        ...line('ra', curve.raAmplitudeArcsec),
        color: colours.ra,
        lineStyle: { width: 1.5 },
        areaStyle: { color: colours.raTint, opacity: 1 },
      },
      {
        ...line('dec', curve.decAmplitudeArcsec),
        color: colours.dec,
        lineStyle: {
          width: 1.4,
          type: colours.decDash.length > 0 ? [...colours.decDash] : 'solid',
        },
      },
    ],
  };
}
