import { DatePipe } from '@angular/common';
import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import { wormPeriodSeconds } from '@stillpier/analysis';
import { type Rig, type RigState } from '@stillpier/contract';
import { arcsecText, secondsText } from '../figures/measure-text';
import { Roundel } from '../figures/roundel/roundel';
import { Emphasis } from '../page/emphasis';
import { Severity } from '../page/severity';
import { MOUNT_KIND_NAMES } from './mount-kinds';
import { TrendLine } from './trend-line';

/** One rig of the list, as it stands after its last night. */
@Component({
  selector: 'app-rig-entry',
  imports: [DatePipe, Emphasis, MatButton, Roundel, RouterLink, Severity, TrendLine],
  templateUrl: './rig-entry.html',
  styleUrl: './rig-entry.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RigEntry {
  readonly rig = input.required<Rig>();
  /** Missing when the rig was made after the states were asked for. */
  readonly state = input.required<RigState | undefined>();
  readonly halfWidthArcsec = input.required<number>();

  protected readonly equipment = computed(() => {
    const { kind, wormTeeth, wormPeriodSeconds: told } = this.rig().mount;
    const scale = this.state()?.imagingScaleArcsecPerPx ?? null;
    const period = told ?? (wormTeeth === null ? null : wormPeriodSeconds(wormTeeth));
    return [
      MOUNT_KIND_NAMES.find((entry) => entry.kind === kind)?.name.toLowerCase(),
      period === null ? undefined : `one turn ${secondsText(Math.round(period))}`,
      scale === null ? undefined : `${arcsecText(scale)} per px`,
    ]
      .filter((part) => part !== undefined)
      .join(', ');
  });
  /** What the roundel needs, when the last night has it all. */
  protected readonly star = computed(() => {
    const { footprint = null, seeingFwhmArcsec = null } = this.state() ?? {};
    return footprint === null || seeingFwhmArcsec === null ? null : { footprint, seeingFwhmArcsec };
  });
  protected readonly mayAddLogs = computed(() => this.rig().role !== 'advisor');
  protected readonly trend = computed(() =>
    (this.state()?.totalRmsTrend ?? []).map(({ totalRmsArcsec }) => totalRmsArcsec),
  );
}
