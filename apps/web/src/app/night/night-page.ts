import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import { NightsApi, type StretchRequest } from '../api/nights-api';
import { RigsApi } from '../api/rigs-api';
import { SetupsApi } from '../api/setups-api';
import { nightDatesText, zoneOffsetText } from '../figures/clock';
import { countedText, countText, percentText } from '../figures/measure-text';
import { roundelHalfWidthArcsec } from '../figures/roundel/star-shape';
import type { SecondsRange } from '../figures/trace-chart/trace-stretch';
import { Emphasis } from '../page/emphasis';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { BudgetPlate } from './budget-plate';
import { ByHandPlate } from './by-hand-plate';
import { MountPlate } from './mount-plate';
import { NightLogs } from './night-logs';
import { NightPlate } from './night-plate';
import { NotesOf } from './notes-of';
import { findingNotes } from './page-notes';
import { ReadingPlate } from './reading-plate';
import { Recomputing } from './recomputing';
import { leadingRun, runTitle, shownRuns, type ShownRun } from './shown-run';
import { SpectrumPlate } from './spectrum-plate';
import { StarPlate } from './star-plate';
import { Tally } from './tally';
import { TracePlate } from './trace-plate';
import { traceHalfRangeArcsec } from './trace-range';
import { WormPlate } from './worm-plate';

/** What the mount did in one night, and what limited the stars. Every number is the document's. */
@Component({
  selector: 'app-night-page',
  imports: [
    BudgetPlate,
    ByHandPlate,
    Emphasis,
    Failure,
    MountPlate,
    NightPlate,
    NotesOf,
    ReadingPlate,
    Recomputing,
    RouterLink,
    SpectrumPlate,
    StarPlate,
    Tally,
    TracePlate,
    Waiting,
    WormPlate,
  ],
  providers: [NightLogs],
  templateUrl: './night-page.html',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled' },
})
export class NightPage {
  private readonly nightsApi = inject(NightsApi);
  private readonly rigs = inject(RigsApi).list;

  readonly rigId = input.required<string>();
  readonly date = input.required<string>();

  protected readonly loaded = this.nightsApi.one(this.rigId, this.date);
  protected readonly night = computed(() =>
    this.loaded.hasValue() ? this.loaded.value() : undefined,
  );
  protected readonly site = computed(() =>
    this.rigs.hasValue()
      ? (this.rigs.value().find(({ id }) => id === this.rigId())?.site ?? null)
      : null,
  );
  protected readonly runs = computed(() => shownRuns(this.night()?.runs ?? []));
  /** Stays through figures that are computed anew. */
  private readonly chosenId = linkedSignal<readonly ShownRun[], string | null>({
    source: this.runs,
    computation: (runs, before) =>
      (runs.find(({ id }) => id === before?.value) ?? leadingRun(runs))?.id ?? null,
  });
  protected readonly run = computed(() => this.runs().find((run) => run.id === this.chosenId()));
  protected readonly notes = computed(() => {
    const run = this.run();
    return run ? findingNotes(run) : [];
  });
  protected readonly runTitle = computed(() => {
    const run = this.run();
    return run ? runTitle(run) : '';
  });

  protected readonly dates = computed(() => nightDatesText(this.date()));
  protected readonly counts = computed(() => {
    const summary = this.night()?.summary;
    if (!summary) return null;
    const aside = summary.frames === 0 ? 0 : 1 - summary.used / summary.frames;
    return {
      runs: countedText(summary.runCount, 'run', 'runs'),
      frames: `${countText(summary.frames)} frames, ${percentText(aside)} set aside`,
    };
  });
  protected readonly zone = computed(() => {
    const night = this.night();
    if (!night) return '';
    const offset = zoneOffsetText(Date.parse(night.summary.startsAt), night.timeZone);
    return `Times are local at the site, ${night.timeZone}, ${offset}.`;
  });

  /** One scale for all runs of the night, so that they can be compared. */
  protected readonly halfRangeArcsec = computed(() =>
    traceHalfRangeArcsec(this.runs().map(({ of }) => of.run)),
  );
  protected readonly halfWidthArcsec = computed(() =>
    roundelHalfWidthArcsec(this.runs().flatMap(({ of }) => of.run.footprint ?? [])),
  );
  protected readonly topAmplitudeArcsec = computed(() => {
    const peaks = this.runs().flatMap(({ of }) => [
      ...(of.run.spectrum?.ra.peaks ?? []),
      ...(of.run.spectrum?.dec.peaks ?? []),
    ]);
    return peaks.length === 0 ? null : Math.max(...peaks.map((peak) => peak.amplitudeArcsec));
  });

  protected readonly stretches = this.nightsApi.runs(
    computed(() => {
      const night = this.night();
      return night?.runs.map(({ id, run }) => ({
        rigId: night.rigId,
        runId: id,
        fromSeconds: 0,
        toSeconds: run.durationSeconds,
      }));
    }),
  );
  protected readonly stretchOf = computed(() =>
    this.stretches.hasValue() ? this.stretches.value() : new Map<string, never>(),
  );

  protected readonly maySetAside = inject(RigsApi).mayEdit(this.rigId);
  /** A stretch of the chosen run. */
  protected readonly selection = linkedSignal<string | null, SecondsRange | null>({
    source: this.chosenId,
    computation: () => null,
  });

  /** Runs that came thinned, once more in full: a sub is predicted from every frame. */
  private readonly fullRuns = this.nightsApi.frames(
    computed(() => {
      if (!this.stretches.hasValue()) return undefined;
      const thinned = this.stretches.value();
      return this.runs()
        .filter(({ id, of }) => of.run.subs && thinned.get(id)?.thinned)
        .map(({ id, of }) => ({
          rigId: this.rigId(),
          runId: id,
          fromSeconds: 0,
          toSeconds: of.run.durationSeconds,
        }));
    }),
  );
  protected readonly frames = computed(() => {
    const whole = [...this.stretchOf()].filter(([, stretch]) => !stretch.thinned);
    return new Map([...whole, ...(this.fullRuns.hasValue() ? this.fullRuns.value() : [])]);
  });
  private readonly setupList = inject(SetupsApi).list(this.rigId);
  protected readonly setups = computed(() =>
    this.setupList.hasValue() ? this.setupList.value() : [],
  );

  private readonly wanted = signal<StretchRequest | undefined>(undefined);
  private readonly finer = this.nightsApi.stretch(this.wanted);
  /** Of the run that is shown, never of the one before it. */
  protected readonly detail = computed(() =>
    this.finer.hasValue() && this.wanted()?.runId === this.run()?.id ? this.finer.value() : null,
  );

  protected readonly spectrum = this.nightsApi.spectrum(
    computed(() => {
      const run = this.run();
      return run?.of.run.spectrum ? { rigId: this.rigId(), runId: run.id } : undefined;
    }),
  );

  protected choose(runId: string): void {
    this.chosenId.set(runId);
  }

  protected askFiner(range: SecondsRange): void {
    const run = this.run();
    if (run) this.wanted.set({ rigId: this.rigId(), runId: run.id, ...range });
  }
}
