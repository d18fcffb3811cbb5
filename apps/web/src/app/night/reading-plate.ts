import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { RouterLink } from '@angular/router';
import { exportPaths, type Night } from '@stillpier/contract';
import { countedText, countText, NO_VALUE } from '../figures/measure-text';
import type { ShownRun } from './shown-run';
import { WaysOut } from './ways-out';

const REASONS = ['dither', 'settling', 'star lost', 'by hand'] as const;
const MOST_REFUSED_SHOWN = 20;

/** What was read, what was refused and what was set aside. */
@Component({
  selector: 'app-reading-plate',
  imports: [RouterLink, WaysOut],
  templateUrl: './reading-plate.html',
  styleUrl: './reading-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadingPlate {
  readonly rigId = input.required<string>();
  readonly date = input.required<string>();
  readonly logs = input.required<Night['logs']>();
  readonly runs = input.required<readonly ShownRun[]>();

  protected readonly archive = computed(() => exportPaths.night(this.rigId(), this.date()));
  protected readonly files = computed(() =>
    this.logs().map(({ importId, fileName, analysisVersion, reading }) => ({
      importId,
      fileName,
      analysisVersion,
      lines: countText(reading.lines),
      frames: countText(reading.frames),
      refusedCount: reading.refusedCount,
      refusedText: countText(reading.refusedCount),
      refused: reading.refused.slice(0, MOST_REFUSED_SHOWN).map(({ line, reason }) => ({
        line: countText(line),
        reason,
      })),
      further: reading.refusedCount - Math.min(reading.refused.length, MOST_REFUSED_SHOWN),
      warnings: reading.warnings,
    })),
  );
  protected readonly refusing = computed(() =>
    this.files().filter((file) => file.refusedCount > 0),
  );

  protected readonly reasons = REASONS;
  protected readonly aside = computed(() =>
    this.runs().map(({ id, name, of: { run } }) => {
      const counts = REASONS.map((reason) =>
        run.setAside
          .filter((stretch) => stretch.reason === reason)
          .reduce((sum, stretch) => sum + stretch.frames, 0),
      );
      const texts = counts.map((frames) => (frames === 0 ? NO_VALUE : countText(frames)));
      return {
        id,
        name,
        frames: countText(run.frames),
        used: countText(run.used),
        counts: texts,
        reasonsText: REASONS.flatMap((reason, i) =>
          counts[i] ? [`${reason} ${texts[i]}`] : [],
        ).join(', '),
      };
    }),
  );

  protected readonly lines = (count: number): string => countedText(count, 'line', 'lines');
}
