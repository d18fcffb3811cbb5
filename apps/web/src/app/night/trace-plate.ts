import { ChangeDetectionStrategy, Component, computed, input, model, output } from '@angular/core';
import type { RunStretch } from '../api/run-stretch';
import { arcsecText, countText } from '../figures/measure-text';
import { TraceChart, type TraceKey } from '../figures/trace-chart/trace-chart';
import type { SecondsRange } from '../figures/trace-chart/trace-stretch';
import { worstMoments } from '../figures/trace-chart/worst-moments';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { keyedOn, type FindingNote } from './page-notes';
import { RunChips } from './run-chips';
import { runTitle, type ShownRun } from './shown-run';

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
  readonly error = input.required<unknown>();
  readonly detail = input.required<RunStretch | null>();
  readonly halfRangeArcsec = input.required<number>();
  readonly maySelect = input.required<boolean>();
  readonly selection = model.required<SecondsRange | null>();
  readonly notes = input.required<readonly FindingNote[]>();
  readonly choose = output<string>();
  readonly stretchWanted = output<SecondsRange>();
  readonly retry = output();

  protected readonly title = computed(() => runTitle(this.chosen()));
  protected readonly run = computed(() => this.chosen().of.run);
  protected readonly aside = computed(() => {
    const { frames, used } = this.run();
    return `${countText(frames - used)} of ${countText(frames)}`;
  });
  protected readonly keys = computed((): TraceKey[] => {
    const stretch = this.stretch();
    if (!stretch) return [];
    const [worst] = worstMoments(stretch, 1, 0);
    return keyedOn('trace', this.notes()).map(({ key, axis }) => ({
      ...key,
      axis: worst?.axis ?? axis,
      atSeconds: worst?.seconds ?? 0,
    }));
  });
  protected readonly why = computed(
    () => this.run().whyMissing['ra'] ?? 'The run has no error in arcseconds.',
  );
  protected readonly label = computed(() => {
    const { ra, dec } = this.run();
    const rms = `RA ${arcsecText(ra?.rmsArcsec ?? null)} and Dec ${arcsecText(dec?.rmsArcsec ?? null)} RMS`;
    return `Guide error of ${this.title()}: ${rms}, ${this.aside()} frames set aside.`;
  });
}
