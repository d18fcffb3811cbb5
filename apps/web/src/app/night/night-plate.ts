import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import type { Site } from '@stillpier/contract';
import type { RunStretch } from '../api/run-stretch';
import { countedText, percentText, ratioText, secondsText } from '../figures/measure-text';
import { NightRibbon, type RibbonKey } from '../figures/night-ribbon/night-ribbon';
import { endMs, type RibbonRun } from '../figures/night-ribbon/ribbon-night';
import { nightSpells, ribbonSkies, skyText, sunDown } from './night-sky';
import { keyedOn, type FindingNote } from './page-notes';
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
  /** Of the evening. */
  readonly date = input.required<string>();
  /** null until it is known. */
  readonly site = input.required<Site | null>();
  readonly stretches = input.required<ReadonlyMap<string, RunStretch>>();
  readonly notes = input.required<readonly FindingNote[]>();
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
  private readonly spells = computed(() => {
    const site = this.site();
    return site ? nightSpells(site, this.date()) : [];
  });
  protected readonly skies = computed(() => ribbonSkies(this.spells()));
  protected readonly skyText = computed(() => skyText(this.spells(), this.timeZone()));
  /** From before sunset to after sunrise, and wide enough for every run. */
  protected readonly sight = computed(() => {
    const night = sunDown(this.skies());
    const starts = this.ribbonRuns().map((run) => run.startMs);
    return {
      fromMs: Math.min(...starts, ...(night ? [night.setMs] : [])) - EDGE_MS,
      toMs: Math.max(...this.ribbonRuns().map(endMs), ...(night ? [night.riseMs] : [])) + EDGE_MS,
    };
  });

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
  protected readonly keys = computed((): RibbonKey[] => {
    const { startMs, of } = this.chosen();
    if (startMs === null) return [];
    const [longest] = of.run.setAside
      .filter(({ reason }) => reason === 'star lost')
      .sort((a, b) => b.frames - a.frames);
    return keyedOn('night', this.notes()).map(({ key, finding }) => {
      const lost = finding.code === 'star-lost' ? longest : undefined;
      return { ...key, atMs: startMs + 1000 * (lost?.fromSeconds ?? 0) };
    });
  });
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
