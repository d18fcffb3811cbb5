import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  model,
  output,
  signal,
} from '@angular/core';
import { NgxEchartsDirective, provideEchartsCore } from 'ngx-echarts';
import { init } from '../echarts-setup';
import { elementWidthPx } from '../element-width';
import { FigureKey, type KeyOfNote } from '../figure-key/figure-key';
import { FigureTable, type FigureColumn } from '../figure-table/figure-table';
import { countText, secondsText } from '../measure-text';
import { ReadingLine } from '../reading-line/reading-line';
import { TokenColours } from '../token-colours';
import { frameReading, type SetAsideStretch } from './frame-reading';
import { StretchSelection } from './stretch-selection';
import { traceColumns } from './trace-columns';
import {
  BOTTOM_PX,
  HEIGHT_PX,
  LEFT_PX,
  RIGHT_PX,
  stripTopPx,
  traceContent,
  traceFrame,
} from './trace-options';
import { traceTicks } from './trace-ticks';
import {
  covers,
  firstAtOrAfter,
  nearestIndex,
  type SecondsRange,
  type TraceStretch,
} from './trace-stretch';

const NARROWEST_PX = 700;
const ASK_AFTER_MS = 200;
/** A thinned stretch this many times as long as what is in sight is too coarse for it. */
const COARSE_FROM = 2.5;
const MOST_TABLE_ROWS = 300;
const MOMENT_SECONDS = 180;

/** A key at a time of the run, on the strip of one axis. */
export interface TraceKey extends KeyOfNote {
  readonly atSeconds: number;
  readonly axis: 'ra' | 'dec';
}

interface DataZoomEvent {
  readonly start?: number;
  readonly end?: number;
  readonly batch?: readonly { readonly start?: number; readonly end?: number }[];
}

/** Guide error of a run over time: RA above Dec on one scale, from the whole run down to single frames. */
@Component({
  selector: 'app-trace-chart',
  imports: [FigureKey, FigureTable, NgxEchartsDirective, ReadingLine, StretchSelection],
  providers: [provideEchartsCore({ echarts: { init } })],
  templateUrl: './trace-chart.html',
  styleUrl: './trace-chart.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TraceChart {
  private readonly tokenColours = inject(TokenColours);

  /** Says the result of the run. */
  readonly label = input.required<string>();
  /** The whole run. */
  readonly stretch = input.required<TraceStretch>();
  /** A finer stretch that was asked for. */
  readonly detail = input.required<TraceStretch | null>();
  readonly durationSeconds = input.required<number>();
  /** null: the log tells no time of day, and the axis counts from the start of the run. */
  readonly startMs = input.required<number | null>();
  readonly timeZone = input.required<string>();
  readonly setAside = input.required<readonly SetAsideStretch[]>();
  /** The same for all runs that are compared. */
  readonly halfRangeArcsec = input.required<number>();
  readonly keys = input<readonly TraceKey[]>([]);
  readonly stretchWanted = output<SecondsRange>();
  /** Whether a stretch of the run may be selected. */
  readonly maySelect = input(false);
  readonly selection = model<SecondsRange | null>(null);
  protected readonly selecting = signal(false);

  private readonly elementPx = elementWidthPx(920);
  protected readonly widthPx = computed(() => Math.max(NARROWEST_PX, this.elementPx()));
  protected readonly plotPx = computed(() => this.widthPx() - LEFT_PX - RIGHT_PX);
  protected readonly heightPx = HEIGHT_PX;
  protected readonly bottomPx = BOTTOM_PX;
  protected readonly leftPx = LEFT_PX;

  protected readonly sight = linkedSignal<SecondsRange>(() => ({
    fromSeconds: 0,
    toSeconds: this.durationSeconds(),
  }));
  protected readonly zoomed = computed(
    () => this.sight().toSeconds - this.sight().fromSeconds < this.durationSeconds() * 0.999,
  );
  private readonly shown = computed(() => {
    const detail = this.detail();
    return detail && covers(detail, this.sight()) ? detail : this.stretch();
  });
  private readonly columns = computed(() =>
    traceColumns(this.shown(), this.sight(), Math.floor(this.plotPx())),
  );

  protected readonly frameOptions = computed(() =>
    traceFrame({
      colours: this.tokenColours.colours(),
      durationSeconds: this.durationSeconds(),
      halfRangeArcsec: this.halfRangeArcsec(),
    }),
  );
  protected readonly contentOptions = computed(() => ({
    ...traceContent({
      colours: this.tokenColours.colours(),
      durationSeconds: this.durationSeconds(),
      halfRangeArcsec: this.halfRangeArcsec(),
      columns: this.columns(),
      setAside: this.setAside(),
      ticks: this.ticks(),
    }),
    dataZoom: [{ startValue: this.sight().fromSeconds, endValue: this.sight().toSeconds }],
  }));
  /** Inside the upper edge of the strip; at the near side where its time is out of sight. */
  protected readonly placedKeys = computed(() => {
    const { fromSeconds, toSeconds } = this.sight();
    return this.keys().map((key) => {
      const share = (key.atSeconds - fromSeconds) / (toSeconds - fromSeconds);
      const xPx = LEFT_PX + Math.min(1, Math.max(0, share)) * this.plotPx();
      return { ...key, at: { xPx, yPx: stripTopPx(key.axis) + 9 } };
    });
  });
  protected readonly drawn = computed(() => {
    const step = this.columns().stepSeconds;
    if (step === 0) return 'Dots: single frames.';
    const whose = this.shown().thinned ? 'the middle of its frames' : 'its mean';
    return `Tint: every kept frame. Line: ${whose}, taken over each ${secondsText(step)}.`;
  });

  private readonly readingSeconds = signal<number | null>(null);
  protected readonly reading = computed(() => {
    const seconds = this.readingSeconds();
    const shown = this.shown();
    const index = seconds === null ? -1 : nearestIndex(shown.timeSeconds, seconds);
    return index < 0 ? null : this.readingOf(shown, index);
  });

  protected readonly readingText = computed(() => {
    const at = this.reading();
    return at && `${at.time}, RA ${at.ra}, Dec ${at.dec}, ${at.state}`;
  });

  protected readonly tableColumns: readonly FigureColumn[] = [
    { head: 'Time', numeric: true },
    { head: 'RA', numeric: true },
    { head: 'Dec', numeric: true },
    { head: 'Frame', numeric: false },
  ];
  protected readonly tableRows = computed(() => {
    const shown = this.shown();
    const { fromSeconds, toSeconds } = this.sight();
    const inSight = [...shown.timeSeconds.keys()].filter((index) => {
      const seconds = shown.timeSeconds[index] ?? NaN;
      return seconds >= fromSeconds && seconds <= toSeconds;
    });
    const every = Math.max(1, Math.ceil(inSight.length / MOST_TABLE_ROWS));
    return inSight
      .filter((_, i) => i % every === 0)
      .map((index) => {
        const reading = this.readingOf(shown, index);
        return [reading.time, reading.ra, reading.dec, reading.state];
      });
  });
  protected readonly tableTitle = computed(
    () => `Guide error in sight, at most ${countText(MOST_TABLE_ROWS)} frames evenly chosen`,
  );

  constructor() {
    effect((onCleanup) => {
      const wanted = this.wanted();
      if (!wanted) return;
      const timer = setTimeout(() => {
        this.stretchWanted.emit(wanted);
      }, ASK_AFTER_MS);
      onCleanup(() => {
        clearTimeout(timer);
      });
    });
  }

  private readonly wanted = computed((): SecondsRange | null => {
    const shown = this.shown();
    const sight = this.sight();
    const length = sight.toSeconds - sight.fromSeconds;
    if (!shown.thinned || shown.toSeconds - shown.fromSeconds <= COARSE_FROM * length) return null;
    return {
      fromSeconds: Math.max(0, sight.fromSeconds - length / 2),
      toSeconds: Math.min(this.durationSeconds(), sight.toSeconds + length / 2),
    };
  });

  protected followZoom(event: unknown): void {
    const { batch, ...single } = event as DataZoomEvent;
    const { start, end } = batch?.[0] ?? single;
    if (start === undefined || end === undefined) return;
    this.sight.set({
      fromSeconds: (start / 100) * this.durationSeconds(),
      toSeconds: (end / 100) * this.durationSeconds(),
    });
  }

  protected zoom(factor: number): void {
    const { fromSeconds, toSeconds } = this.sight();
    const middle = this.readingInSight() ?? (fromSeconds + toSeconds) / 2;
    const length = Math.min(
      this.durationSeconds(),
      Math.max(20, (toSeconds - fromSeconds) * factor),
    );
    this.show(middle - length / 2, length);
  }

  protected pan(share: number): void {
    const { fromSeconds, toSeconds } = this.sight();
    const length = toSeconds - fromSeconds;
    this.show(fromSeconds + share * length, length);
  }

  protected showWholeRun(): void {
    this.show(0, this.durationSeconds());
  }

  /** The frames around a moment, with the reading line on it. */
  showMoment(seconds: number): void {
    this.show(seconds - MOMENT_SECONDS / 2, Math.min(MOMENT_SECONDS, this.durationSeconds()));
    this.readingSeconds.set(seconds);
  }

  private show(fromSeconds: number, length: number): void {
    const from = Math.min(Math.max(0, fromSeconds), this.durationSeconds() - length);
    this.sight.set({ fromSeconds: from, toSeconds: from + length });
  }

  private readingInSight(): number | null {
    const reading = this.reading();
    const { fromSeconds, toSeconds } = this.sight();
    return reading && reading.seconds >= fromSeconds && reading.seconds <= toSeconds
      ? reading.seconds
      : null;
  }

  protected readAt(event: PointerEvent): void {
    const box = (event.currentTarget as HTMLElement).getBoundingClientRect();
    const { fromSeconds, toSeconds } = this.sight();
    const share = (event.clientX - box.left - LEFT_PX) / this.plotPx();
    this.readingSeconds.set(
      share < 0 || share > 1 ? null : fromSeconds + share * (toSeconds - fromSeconds),
    );
  }

  protected stopReading(): void {
    this.readingSeconds.set(null);
  }

  protected moveReading(step: number): void {
    const times = this.shown().timeSeconds;
    const { fromSeconds, toSeconds } = this.sight();
    const now = this.readingInSight();
    const first = firstAtOrAfter(times, fromSeconds);
    const last = firstAtOrAfter(times, toSeconds + 1e-6) - 1;
    const index = now === null ? first : nearestIndex(times, now) + step;
    this.readingSeconds.set(times[Math.min(last, Math.max(first, index))] ?? null);
  }

  private readonly ticks = computed(() =>
    traceTicks(this.sight(), this.startMs(), this.timeZone(), this.plotPx()),
  );

  private readingOf(shown: TraceStretch, index: number) {
    const { fromSeconds, toSeconds } = this.sight();
    const reading = frameReading(shown, index, {
      setAside: this.setAside(),
      startMs: this.startMs(),
      timeZone: this.timeZone(),
    });
    const share = (reading.seconds - fromSeconds) / (toSeconds - fromSeconds);
    return { ...reading, leftPx: LEFT_PX + share * this.plotPx() };
  }
}
