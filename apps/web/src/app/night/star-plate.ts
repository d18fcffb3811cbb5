import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { RouterLink } from '@angular/router';
import { arcsecText, degreesText, ratioText } from '../figures/measure-text';
import { Roundel } from '../figures/roundel/roundel';
import { angleFromRaDegrees } from '../figures/roundel/star-shape';
import { keyedOn, type FindingNote } from './page-notes';
import { RunTable } from './run-table';
import { runTitle, type ShownRun } from './shown-run';

/** The star that the camera would record in the chosen run, beside all runs of the night. */
@Component({
  selector: 'app-star-plate',
  imports: [Roundel, RouterLink, RunTable],
  templateUrl: './star-plate.html',
  styleUrl: './star-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class StarPlate {
  readonly runs = input.required<readonly ShownRun[]>();
  readonly chosen = input.required<ShownRun>();
  readonly timeZone = input.required<string>();
  readonly halfWidthArcsec = input.required<number>();
  readonly rigId = input.required<string>();
  readonly notes = input.required<readonly FindingNote[]>();
  readonly choose = output<string>();

  protected readonly title = computed(() => runTitle(this.chosen()));
  protected readonly run = computed(() => this.chosen().of.run);
  protected readonly seeing = computed(() => this.chosen().of.seeingFwhmArcsec);
  protected readonly pxArcsec = computed(() => this.chosen().of.optics.imagingScaleArcsecPerPx);
  protected readonly keys = computed(() => keyedOn('star', this.notes()).map(({ key }) => key));
  protected readonly width = computed(() => arcsecText(2 * this.halfWidthArcsec()));

  /** The star and the seeing that it was predicted with. */
  protected readonly shape = computed(() => {
    const star = this.run().footprint;
    const seeingFwhmArcsec = this.seeing();
    return star && seeingFwhmArcsec !== null ? { star, seeingFwhmArcsec } : null;
  });
  protected readonly facts = computed(() => {
    const star = this.shape()?.star;
    if (!star) return null;
    const { fwhmMajorArcsec: major, fwhmMinorArcsec: minor } = star;
    const scale = this.pxArcsec();
    const angle = angleFromRaDegrees(star.positionAngleDegrees);
    return {
      fwhm: `${arcsecText(major)} × ${arcsecText(minor)}`,
      px:
        scale === null
          ? null
          : `${ratioText(major / scale)} × ${ratioText(minor / scale)} px of ${arcsecText(scale)}`,
      aspect: ratioText(star.aspect),
      axis: `${degreesText(angle)} from RA toward Dec`,
      seeing: `${arcsecText(this.seeing())} FWHM, dashed, as set`,
    };
  });
  protected readonly why = computed(
    () =>
      this.run().whyMissing['footprint'] ??
      'The shape of the star cannot be told without the seeing.',
  );
}
