import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { arcsecText, ratioText, secondsText } from '../figures/measure-text';
import { WormDial } from '../figures/worm-dial/worm-dial';
import { keyedOn, type FindingNote } from './page-notes';
import { runTitle, type ShownRun } from './shown-run';

/** The mount's own error over one turn of the worm, corrections undone. */
@Component({
  selector: 'app-worm-plate',
  imports: [WormDial],
  templateUrl: './worm-plate.html',
  styleUrl: './worm-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class WormPlate {
  readonly run = input.required<ShownRun>();
  readonly notes = input.required<readonly FindingNote[]>();

  protected readonly title = computed(() => runTitle(this.run()));
  protected readonly keys = computed(() => keyedOn('worm', this.notes()).map(({ key }) => key));
  protected readonly error = computed(() => this.run().of.run.periodicError);
  protected readonly peakToPeak = computed(() =>
    arcsecText(this.error()?.peakToPeakArcsec ?? null),
  );
  protected readonly label = computed(() => {
    const error = this.error();
    return error
      ? `Periodic error ${arcsecText(error.peakToPeakArcsec)} peak to peak over ${secondsText(error.periodSeconds)}.`
      : '';
  });
  protected readonly caption = computed(() => {
    const error = this.error();
    if (!error) return '';
    const from = error.periodFrom === 'rig' ? 'as the rig has it' : 'found in the spectrum';
    const where = error.atAxis ? 'Given at the RA axis.' : 'Given at the guide star.';
    return `Corrections undone, ${ratioText(error.turns)} turns folded on ${secondsText(error.periodSeconds)}, ${from}. ${where} Line: median. Tint: the middle half of the frames. Steepest: ${arcsecText(error.steepestArcsecPerSecond)} per second.`;
  });
  protected readonly harmonics = computed(() => {
    const peaks = this.run().of.run.spectrum?.ra.peaks ?? [];
    return (this.error()?.harmonics ?? []).map((harmonic) => {
      const name = harmonic.order === 1 ? 'worm' : `worm / ${harmonic.order}`;
      const left = peaks.find((peak) => peak.label === name);
      return {
        name: harmonic.order === 1 ? 'Worm, one turn' : `Worm ÷ ${harmonic.order}`,
        period: secondsText(harmonic.periodSeconds),
        amplitude: arcsecText(harmonic.amplitudeArcsec),
        error: arcsecText(harmonic.standardError),
        left: left ? arcsecText(left.amplitudeArcsec) : 'no peak',
      };
    });
  });
  protected readonly why = computed(
    () =>
      this.run().of.run.whyMissing['periodicError'] ??
      'The periodic error cannot be told from this run.',
  );
}
