import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { describeOptics } from '@stillpier/analysis';
import { SetupsApi } from '../api/setups-api';
import { arcsecText, NO_VALUE, ratioText } from '../figures/measure-text';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { knownOptics } from '../setups/known-optics';

/** The setups of a rig, with the two figures that tell them apart. */
@Component({
  selector: 'app-setup-list',
  imports: [Failure, MatButton, RouterLink, Waiting],
  templateUrl: './setup-list.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class SetupList {
  readonly rigId = input.required<string>();
  readonly mayEdit = input.required<boolean>();

  protected readonly setups = inject(SetupsApi).list(this.rigId);
  protected readonly lines = computed(() =>
    (this.setups.hasValue() ? this.setups.value() : []).map((setup) => {
      const { imagingScaleArcsecPerPx: scale, scaleRatio } = describeOptics(knownOptics(setup));
      return {
        setup,
        scale: scale === null ? NO_VALUE : `${arcsecText(scale)} per px`,
        ratio: ratioText(scaleRatio),
      };
    }),
  );
}
