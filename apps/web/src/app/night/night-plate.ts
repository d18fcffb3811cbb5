import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { RunStretch } from '../api/run-stretch';
import { countedText, percentText, ratioText, secondsText } from '../figures/measure-text';
import { NightRibbon } from '../figures/night-ribbon/night-ribbon';
import { endMs, type RibbonRun } from '../figures/night-ribbon/ribbon-night';
import type { ShownRun } from './shown-run';

const EDGE_MS = 20 * 60_000;

/** The whole night on one time axis, with the subs that it would have given. */
@Component({
  selector: 'app-night-plate',
  imports: [NightRibbon],
  templateUrl: './night-plate.html',
  styleUrl: './night-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class NightPlate {
  readonly runs = input.required<readonly ShownRun[]>();
  readonly chosen = input.required<ShownRun>();
  readonly timeZone = input.required<string>();
  readonly stretches = input.required<ReadonlyMap<string, RunStretch>>();
  readonly choose = output<string>();

  protected readonly ribbonRuns = computed((): RibbonRun[] =>
    this.runs().flatMap(({ id, name, startMs, of: { run } }) =>
      startMs === null
        ? []
        : [
            {
              id,
              name,
              startMs,
              durationSeconds: run.durationSeconds,
              totalRmsArcsec: run.total?.rmsArcsec ?? null,
              stretch: this.stretches().get(id) ?? null,
              setAside: run.setAside,
              subs: run.subs,
            },
          ],
    ),
  );
  protected readonly sight = computed(() => ({
    fromMs: Math.min(...this.ribbonRuns().map((run) => run.startMs)) - EDGE_MS,
    toMs: Math.max(...this.ribbonRuns().map(endMs)) + EDGE_MS,
  }));

  /** Runs may differ in their setups, and so in the length of a sub. */
  protected readonly forecasts = computed(() => {
    const byLength = new Map<
      string,
      { length: string; limit: string; count: number; within: number }
    >();
    for (const { of } of this.runs()) {
      const { subs } = of.run;
      if (!subs) continue;
      const length = secondsText(subs.lengthSeconds);
      const limit = ratioText(subs.keepAspect);
      const key = `${length} ${limit}`;
      const known = byLength.get(key) ?? { length, limit, count: 0, within: 0 };
      byLength.set(key, {
        ...known,
        count: known.count + subs.count,
        within: known.within + subs.within,
      });
    }
    return [...byLength.values()].map((forecast) => ({
      ...forecast,
      share: percentText(forecast.count === 0 ? null : forecast.within / forecast.count),
      kept: `${forecast.within} of ${countedText(forecast.count, 'sub', 'subs')}`,
    }));
  });
  protected readonly whyNoForecast = computed(
    () => this.chosen().of.run.whyMissing['subs'] ?? null,
  );
  protected readonly thinned = computed(() =>
    [...this.stretches().values()].some((stretch) => stretch.thinned),
  );
  protected readonly label = computed(() => {
    const runs = countedText(this.runs().length, 'run', 'runs');
    const kept = this.forecasts()
      .map(({ kept, length, limit }) => `${kept} of ${length} within the keep limit of ${limit}`)
      .join('; ');
    return kept === '' ? `${runs} over the night.` : `${runs} over the night; ${kept}.`;
  });
}
