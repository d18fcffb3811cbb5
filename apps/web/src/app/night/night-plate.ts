import {
  ChangeDetectionStrategy,
  Component,
  computed,
  input,
  output,
  resource,
  signal,
} from '@angular/core';
import type { Setup, Site } from '@stillpier/contract';
import type { RunStretch } from '../api/run-stretch';
import {
  countedText,
  NO_VALUE,
  percentText,
  ratioText,
  secondsText,
} from '../figures/measure-text';
import { NightRibbon, type RibbonKey } from '../figures/night-ribbon/night-ribbon';
import { endMs, type RibbonRun } from '../figures/night-ribbon/ribbon-night';
import { nightSpells, ribbonSkies, skyText, sunDown } from './night-sky';
import { keyedOn, type FindingNote } from './page-notes';
import { runTitle, type ShownRun } from './shown-run';
import { subChoices } from './sub-choices';
import { forecastRuns, type Subs } from './sub-forecasts';
import { SubLengthChoice, type SubLengthOption } from './sub-length-choice';

const EDGE_MS = 20 * 60_000;

/** The whole night on one time axis, with the subs that it would have given. */
@Component({
  selector: 'app-night-plate',
  imports: [NightRibbon, SubLengthChoice],
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
  /** Every frame of the runs; empty until they are there. */
  readonly frames = input.required<ReadonlyMap<string, RunStretch>>();
  readonly setups = input.required<readonly Setup[]>();
  readonly notes = input.required<readonly FindingNote[]>();
  readonly choose = output<string>();

  protected readonly ribbonRuns = computed((): RibbonRun[] =>
    this.runs().flatMap((each) => {
      const {
        id,
        name,
        startMs,
        of: { run },
      } = each;
      return startMs === null
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
              subs: this.subsOf(each),
            },
          ];
    }),
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

  protected readonly wantedSeconds = signal<number | null>(null);
  /** null: the runs differ, and each goes by its own setup. */
  protected readonly lengthSeconds = computed(() => {
    const own = new Set(this.runs().flatMap(({ of }) => of.run.subs?.lengthSeconds ?? []));
    const [only] = own;
    return this.wantedSeconds() ?? (own.size === 1 ? (only ?? null) : null);
  });
  private readonly choices = computed(() => subChoices(this.runs(), this.setups()));
  private readonly worked = resource({
    params: () => ({
      runs: this.runs(),
      frames: this.frames(),
      lengths: this.choices().map(({ seconds }) => seconds),
    }),
    loader: ({ params, abortSignal }) =>
      forecastRuns(params.runs, params.frames, params.lengths, abortSignal),
  });
  private readonly forecastsOf = computed(() =>
    this.worked.hasValue() ? this.worked.value() : new Map<string, never>(),
  );

  /** Of the length that is chosen; the document's own until that is worked out. */
  private subsOf({ id, of }: ShownRun): Subs | null {
    const length = this.lengthSeconds();
    if (length === null) return of.run.subs;
    return this.forecastsOf().get(id)?.byLength.get(length) ?? of.run.subs;
  }

  protected readonly options = computed((): SubLengthOption[] => {
    if (!this.runs().some(({ of }) => of.run.subs)) return [];
    return this.choices().map(({ seconds, text }) => {
      const subs = this.runs().flatMap(({ id, of }) => {
        const own = of.run.subs?.lengthSeconds === seconds ? of.run.subs : undefined;
        return own ?? this.forecastsOf().get(id)?.byLength.get(seconds) ?? [];
      });
      const count = subs.reduce((sum, each) => sum + each.count, 0);
      const within = subs.reduce((sum, each) => sum + each.within, 0);
      return { seconds, text, share: count === 0 ? NO_VALUE : percentText(within / count) };
    });
  });
  protected readonly longest = computed(() =>
    this.runs()
      .flatMap((run) => {
        const found = this.forecastsOf().get(run.id);
        if (!found) return [];
        const text = found.longestSeconds === null ? 'none' : secondsText(found.longestSeconds);
        return [`${runTitle(run)} ${text}`];
      })
      .join('; '),
  );

  /** Runs may differ in their setups, and so in the length of a sub. */
  protected readonly forecasts = computed(() => {
    const byLength = new Map<
      string,
      { length: string; limit: string; count: number; within: number }
    >();
    for (const run of this.runs()) {
      const subs = this.subsOf(run);
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
