import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { SpectrumCurve } from '@stillpier/contract';
import { arcsecText, secondsText } from '../figures/measure-text';
import {
  SpectrumChart,
  type SpectrumKey,
  type SpectrumPeak,
} from '../figures/spectrum-chart/spectrum-chart';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { keyedOn, periodOf, type FindingNote } from './page-notes';
import { runTitle, type ShownRun } from './shown-run';

/** The periods that carry the guide error of the chosen run. */
@Component({
  selector: 'app-spectrum-plate',
  imports: [Failure, SpectrumChart, Waiting],
  templateUrl: './spectrum-plate.html',
  styleUrl: './trace-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SpectrumPlate {
  readonly run = input.required<ShownRun>();
  readonly curve = input.required<SpectrumCurve | undefined>();
  readonly error = input.required<unknown>();
  readonly topArcsec = input.required<number | null>();
  readonly notes = input.required<readonly FindingNote[]>();
  readonly retry = output();

  protected readonly title = computed(() => runTitle(this.run()));
  protected readonly spectrum = computed(() => this.run().of.run.spectrum);
  protected readonly peaks = computed((): SpectrumPeak[] => [
    ...(this.spectrum()?.ra.peaks ?? []).map((peak) => ({ ...peak, axis: 'RA' as const })),
    ...(this.spectrum()?.dec.peaks ?? []).map((peak) => ({ ...peak, axis: 'Dec' as const })),
  ]);
  protected readonly keys = computed((): SpectrumKey[] => {
    const notes = keyedOn('spectrum', this.notes());
    return notes.map((note) => ({
      ...note.key,
      periodSeconds: periodOf(note, notes, this.run().of.run),
    }));
  });
  protected readonly label = computed(() => {
    const [first] = [...this.peaks()].sort((a, b) => b.amplitudeArcsec - a.amplitudeArcsec);
    return first
      ? `Strongest in ${this.title()}: ${secondsText(first.periodSeconds)} in ${first.axis}, ${first.label ?? 'not named'}, ${arcsecText(first.amplitudeArcsec)}.`
      : `No period stands out of the noise in ${this.title()}.`;
  });
  protected readonly method = computed(() =>
    this.spectrum()?.ra.method === 'fft'
      ? 'Fourier transform under a Hann window'
      : 'Lomb-Scargle periodogram on the frames’ own times',
  );
  protected readonly why = computed(
    () => this.run().of.run.whyMissing['spectrum'] ?? 'The run has no spectrum.',
  );
}
