import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  model,
  output,
  viewChild,
} from '@angular/core';
import type { RunStretch } from '../api/run-stretch';
import { clockSecondsText } from '../figures/clock';
import { arcsecText, countText, signedArcsecText } from '../figures/measure-text';
import { TraceChart, type TraceKey } from '../figures/trace-chart/trace-chart';
import type { SecondsRange } from '../figures/trace-chart/trace-stretch';
import { worstMoments } from '../figures/trace-chart/worst-moments';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { keyedOn, type FindingNote } from './page-notes';
import { RunChips } from './run-chips';
import { stretchFigures } from './stretch-figures';
import { runTitle, type ShownRun } from './shown-run';

const MOST_MOMENTS = 5;
/** One gust or one slip is one moment. */
const APART_SECONDS = 60;

/** The guide error of the chosen run over time. */
@Component({
  selector: 'app-trace-plate',
  imports: [Failure, RunChips, TraceChart, Waiting],
  templateUrl: './trace-plate.html',
  styleUrl: './trace-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class TracePlate {
  readonly runs = input.required<readonly ShownRun[]>();
  readonly chosen = input.required<ShownRun>();
  readonly timeZone = input.required<string>();
  readonly stretch = input.required<RunStretch | undefined>();
  /** Every frame of the run; undefined until they are there. */
  readonly frames = input.required<RunStretch | undefined>();
  readonly error = input.required<unknown>();
  readonly detail = input.required<RunStretch | null>();
  readonly halfRangeArcsec = input.required<number>();
  readonly maySelect = input.required<boolean>();
  readonly selection = model.required<SecondsRange | null>();
  readonly notes = input.required<readonly FindingNote[]>();
  readonly choose = output<string>();
  readonly stretchWanted = output<SecondsRange>();
  readonly retry = output();

  private readonly chart = viewChild(TraceChart);

  protected readonly title = computed(() => runTitle(this.chosen()));
  protected readonly run = computed(() => this.chosen().of.run);
  /** Of every frame where they are there, else of the thinned steps, whose extremes are the same. */
  protected readonly worst = computed(() => {
    const stretch = this.frames() ?? this.stretch();
    const { startMs } = this.chosen();
    const zone = startMs === null ? 'UTC' : this.timeZone();
    return (stretch ? worstMoments(stretch, MOST_MOMENTS, APART_SECONDS) : []).map((moment) => ({
      ...moment,
      text: `${moment.axis === 'ra' ? 'RA' : 'Dec'} ${signedArcsecText(moment.errorArcsec)}`,
      time: clockSecondsText((startMs ?? 0) + moment.seconds * 1000, zone),
    }));
  });
  /** Of the stretch that is chosen. */
  protected readonly figures = computed(() => {
    const [frames, range] = [this.frames(), this.selection()];
    if (!frames || !range) return null;
    const found = stretchFigures(frames, range);
    return {
      used: `${countText(found.used)} of ${countText(found.frames)}`,
      ra: arcsecText(found.raRmsArcsec),
      dec: arcsecText(found.decRmsArcsec),
      total: arcsecText(found.totalRmsArcsec),
    };
  });
  protected readonly aside = computed(() => {
    const { frames, used } = this.run();
    return `${countText(frames - used)} of ${countText(frames)}`;
  });
  protected readonly keys = computed((): TraceKey[] => {
    const stretch = this.stretch();
    if (!stretch) return [];
    const [worst] = this.worst();
    return keyedOn('trace', this.notes()).map(({ key, axis }) => ({
      ...key,
      axis: worst?.axis ?? axis,
      atSeconds: worst?.seconds ?? 0,
    }));
  });
  protected readonly why = computed(
    () => this.run().whyMissing['ra'] ?? 'The run has no error in arcseconds.',
  );
  protected goTo(seconds: number): void {
    this.chart()?.showMoment(seconds);
  }

  protected readonly label = computed(() => {
    const { ra, dec } = this.run();
    const rms = `RA ${arcsecText(ra?.rmsArcsec ?? null)} and Dec ${arcsecText(dec?.rmsArcsec ?? null)} RMS`;
    return `Guide error of ${this.title()}: ${rms}, ${this.aside()} frames set aside.`;
  });
}
