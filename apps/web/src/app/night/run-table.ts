import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { clockText } from '../figures/clock';
import { arcsecText, ratioText } from '../figures/measure-text';
import { RoundelGlyph } from '../figures/roundel/roundel-glyph';
import type { ShownRun } from './shown-run';

/** The runs of the night; choosing one leads all figures. */
@Component({
  selector: 'app-run-table',
  imports: [RoundelGlyph],
  templateUrl: './run-table.html',
  styleUrl: './run-table.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class RunTable {
  readonly runs = input.required<readonly ShownRun[]>();
  readonly chosenId = input.required<string>();
  readonly timeZone = input.required<string>();
  readonly choose = output<string>();

  protected readonly rows = computed(() =>
    this.runs().map(({ id, name, startMs, of: { run, setupName } }) => ({
      id,
      name,
      setupName,
      time:
        startMs === null
          ? '–'
          : `${clockText(startMs, this.timeZone())}–${clockText(startMs + run.durationSeconds * 1000, this.timeZone())}`,
      ra: arcsecText(run.ra?.rmsArcsec ?? null),
      dec: arcsecText(run.dec?.rmsArcsec ?? null),
      total: arcsecText(run.total?.rmsArcsec ?? null),
      footprint: run.footprint,
      aspect: ratioText(run.footprint?.aspect ?? null),
      kept: run.subs ? `${run.subs.within} of ${run.subs.count}` : '–',
    })),
  );
  /** Named only where the runs of a night differ in it. */
  protected readonly withSetups = computed(
    () => new Set(this.rows().map((row) => row.setupName)).size > 1,
  );
}
