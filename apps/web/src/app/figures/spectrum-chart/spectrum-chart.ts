import { ChangeDetectionStrategy, Component, computed, inject, input, signal } from '@angular/core';
import { NgxEchartsDirective, provideEchartsCore } from 'ngx-echarts';
import { init } from '../echarts-setup';
import { elementWidthPx } from '../element-width';
import { FigureKey, type KeyOfNote } from '../figure-key/figure-key';
import { FigureTable, type FigureColumn } from '../figure-table/figure-table';
import { arcsecText, percentText, secondsText } from '../measure-text';
import { ReadingLine } from '../reading-line/reading-line';
import { logScale, roundStep } from '../scale';
import { TokenColours } from '../token-colours';
import { peakHeld, type AmplitudeCurve } from './peak-hold';
import { placePeakNames, type PeakPlace } from './peak-names';
import {
  HEIGHT_PX,
  LEFT_PX,
  PLOT_PX,
  RIGHT_PX,
  spectrumOptions,
  TOP_PX,
  type SpectrumFrame,
} from './spectrum-options';

const MOST_NAMES = 6;
/** Room over the highest peak for its name. */
const HEADROOM = 1.35;
const CHARACTER_PX = 7.3;

/** A key at a period; null: at the left, for the curve as a whole. */
export interface SpectrumKey extends KeyOfNote {
  readonly periodSeconds: number | null;
}

export interface SpectrumPeak {
  readonly axis: 'RA' | 'Dec';
  readonly periodSeconds: number;
  readonly amplitudeArcsec: number;
  readonly share: number;
  /** null: it fits no period of the rig. */
  readonly label: string | null;
}

/** Amplitude of the guide error by period: RA filled, Dec a line, the strongest peaks named at their place. */
@Component({
  selector: 'app-spectrum-chart',
  imports: [FigureKey, FigureTable, NgxEchartsDirective, ReadingLine],
  providers: [provideEchartsCore({ echarts: { init } })],
  templateUrl: './spectrum-chart.html',
  styleUrl: './spectrum-chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpectrumChart {
  private readonly tokenColours = inject(TokenColours);

  /** Says the result. */
  readonly label = input.required<string>();
  readonly curve = input.required<AmplitudeCurve>();
  readonly peaks = input.required<readonly SpectrumPeak[]>();
  /** The same for all runs that are compared; null: from this curve. */
  readonly topArcsec = input.required<number | null>();
  readonly keys = input<readonly SpectrumKey[]>([]);

  private readonly widthPx = elementWidthPx(920);
  protected readonly heightPx = HEIGHT_PX;
  protected readonly basePx = TOP_PX + PLOT_PX;
  private readonly held = computed(() =>
    peakHeld(this.curve(), this.widthPx() - LEFT_PX - RIGHT_PX),
  );
  private readonly frame = computed((): SpectrumFrame => {
    const { periodSeconds, raAmplitudeArcsec, decAmplitudeArcsec } = this.held();
    const highest = Math.max(1e-3, ...raAmplitudeArcsec, ...decAmplitudeArcsec);
    const needed = HEADROOM * (this.topArcsec() ?? highest);
    const stepArcsec = roundStep(needed, 5);
    return {
      fromSeconds: periodSeconds[0] ?? 1,
      toSeconds: periodSeconds.at(-1) ?? 10,
      topArcsec: stepArcsec * Math.ceil(needed / stepArcsec),
      stepArcsec,
    };
  });
  private readonly xPx = computed(() => {
    const { fromSeconds, toSeconds } = this.frame();
    return logScale([fromSeconds, toSeconds], [LEFT_PX, this.widthPx() - RIGHT_PX]);
  });
  private readonly yPx = (arcsec: number): number =>
    TOP_PX + PLOT_PX * (1 - Math.min(1, arcsec / this.frame().topArcsec));

  protected readonly options = computed(() =>
    spectrumOptions(this.held(), this.frame(), this.tokenColours.colours()),
  );

  private readonly strongest = computed(() =>
    [...this.peaks()]
      .sort((a, b) => b.amplitudeArcsec - a.amplitudeArcsec)
      .filter(({ periodSeconds }) => {
        const { fromSeconds, toSeconds } = this.frame();
        return periodSeconds >= fromSeconds && periodSeconds <= toSeconds;
      })
      .slice(0, MOST_NAMES)
      .map((peak) => ({
        name: `${peak.axis === 'Dec' ? 'Dec, ' : ''}${nameOf(peak)}`,
        value: `${secondsText(peak.periodSeconds)} ${arcsecText(peak.amplitudeArcsec)}`,
        xPx: this.xPx()(peak.periodSeconds),
        yPx: this.yPx(peak.amplitudeArcsec),
      })),
  );
  protected readonly names = computed(() => {
    const strongest = this.strongest();
    const places: PeakPlace[] = strongest.map(({ xPx, yPx, name, value }) => ({
      xPx,
      yPx,
      widthPx: CHARACTER_PX * Math.max(name.length, value.length) + 6,
    }));
    const plot = {
      left: LEFT_PX,
      right: this.widthPx(),
      top: TOP_PX - 4,
      bottom: this.basePx,
    };
    return placePeakNames(places, plot, (from, to) => this.curveTopPx(from, to)).flatMap(
      ({ index, centrePx, bottomPx }) => {
        const peak = strongest[index];
        return peak ? [{ ...peak, centrePx, bottomPx }] : [];
      },
    );
  });

  /** To the left of the foot of its peak. */
  protected readonly placedKeys = computed(() =>
    this.keys().map((key) => ({
      ...key,
      at: {
        xPx: key.periodSeconds === null ? LEFT_PX + 12 : this.xPx()(key.periodSeconds) - 14,
        yPx: this.basePx - 40,
      },
    })),
  );

  private curveTopPx(fromPx: number, toPx: number): number {
    const { periodSeconds, raAmplitudeArcsec, decAmplitudeArcsec } = this.held();
    const xPx = this.xPx();
    let highest = 0;
    periodSeconds.forEach((period, i) => {
      const x = xPx(period);
      if (x < fromPx || x > toPx) return;
      highest = Math.max(highest, raAmplitudeArcsec[i] ?? 0, decAmplitudeArcsec[i] ?? 0);
    });
    return this.yPx(highest);
  }

  private readonly readingIndex = signal<number | null>(null);
  protected readonly reading = computed(() => {
    const index = this.readingIndex();
    const period = index === null ? undefined : this.held().periodSeconds[index];
    if (index === null || period === undefined) return null;
    return {
      index,
      px: this.xPx()(period),
      period: secondsText(period),
      ra: arcsecText(this.held().raAmplitudeArcsec[index] ?? null),
      dec: arcsecText(this.held().decAmplitudeArcsec[index] ?? null),
    };
  });
  protected readonly readingText = computed(() => {
    const at = this.reading();
    return at && `${at.period}, RA ${at.ra}, Dec ${at.dec}`;
  });
  protected readonly lastIndex = computed(() => this.held().periodSeconds.length - 1);

  protected readAt(event: PointerEvent): void {
    const px = event.clientX - (event.currentTarget as HTMLElement).getBoundingClientRect().left;
    const xPx = this.xPx();
    let nearest = 0;
    this.held().periodSeconds.forEach((period, i, periods) => {
      const closer = Math.abs(xPx(period) - px) < Math.abs(xPx(periods[nearest] ?? period) - px);
      if (closer) nearest = i;
    });
    this.readingIndex.set(px < LEFT_PX ? null : nearest);
  }

  protected stopReading(): void {
    this.readingIndex.set(null);
  }

  protected moveReading(step: number): void {
    const now = this.readingIndex() ?? (step > 0 ? -1 : this.lastIndex() + 1);
    this.readingIndex.set(Math.min(this.lastIndex(), Math.max(0, now + step)));
  }

  protected readonly tableColumns: readonly FigureColumn[] = [
    { head: 'Axis', numeric: false },
    { head: 'Name', numeric: false },
    { head: 'Period', numeric: true },
    { head: 'Amplitude', numeric: true },
    { head: 'Share of the axis', numeric: true },
  ];
  protected readonly tableRows = computed(() =>
    this.peaks().map((peak) => [
      peak.axis,
      nameOf(peak),
      secondsText(peak.periodSeconds),
      arcsecText(peak.amplitudeArcsec),
      percentText(peak.share),
    ]),
  );
}

function nameOf(peak: SpectrumPeak): string {
  return peak.label === null ? 'not named' : peak.label.replace(' / ', ' ÷ ');
}
