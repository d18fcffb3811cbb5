import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
  model,
  signal,
  untracked,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { ChangeByHand } from '@stillpier/contract';
import { ByHandApi } from '../api/by-hand-api';
import { sentenceOf } from '../api/problem-error';
import { dayText, localDateTimeText } from '../figures/clock';
import type { SecondsRange } from '../figures/trace-chart/trace-stretch';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { NightLogs } from './night-logs';
import { runTitle, type ShownRun } from './shown-run';
import { clockAt, secondsAt, stretchText } from './stretch-times';

/** Stretches of the chosen run that people set aside: choose one, say why, and see who did what when. */
@Component({
  selector: 'app-by-hand-plate',
  imports: [Failure, MatButton, Waiting],
  templateUrl: './by-hand-plate.html',
  styleUrl: './by-hand-plate.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ByHandPlate {
  private readonly byHandApi = inject(ByHandApi);
  private readonly nightLogs = inject(NightLogs);

  readonly rigId = input.required<string>();
  readonly run = input.required<ShownRun>();
  readonly timeZone = input.required<string>();
  readonly mayChange = input.required<boolean>();
  readonly selection = model.required<SecondsRange | null>();

  private readonly runId = computed(() => this.run().id);
  protected readonly title = computed(() => runTitle(this.run()));
  protected readonly byHand = this.byHandApi.of(this.rigId, this.runId);
  private readonly clock = computed(() => ({
    startMs: this.run().startMs,
    timeZone: this.timeZone(),
  }));
  protected readonly times = computed(() => {
    const range = this.selection();
    return {
      from: range ? clockAt(this.clock(), range.fromSeconds) : '',
      to: range ? clockAt(this.clock(), range.toSeconds) : '',
    };
  });
  protected readonly reason = signal('');
  protected readonly busy = signal(false);
  protected readonly fault = linkedSignal<SecondsRange | null, string | null>({
    source: this.selection,
    computation: () => null,
  });

  protected readonly stretches = computed(() =>
    (this.byHand.hasValue() ? this.byHand.value().stretches : []).map((range) => ({
      range,
      text: stretchText(this.clock(), range),
    })),
  );
  protected readonly history = computed(() =>
    (this.byHand.hasValue() ? this.byHand.value().history : []).map((entry) => {
      const local = localDateTimeText(Date.parse(entry.at), this.timeZone());
      return {
        ...entry,
        when: `${dayText(local.slice(0, 10))}, ${local.slice(11, 16)}`,
        by: entry.by ?? 'an account that is gone',
        stretch: stretchText(this.clock(), entry),
      };
    }),
  );
  protected readonly canTakeBack = computed(() => {
    const wanted = this.selection();
    return (
      wanted !== null &&
      this.stretches().some(
        ({ range }) => range.fromSeconds < wanted.toSeconds && wanted.fromSeconds < range.toSeconds,
      )
    );
  });

  constructor() {
    // Somebody else, or another window, may have changed it: the log is read again then.
    const state = computed(() => this.nightLogs.of(this.run().of.importId)?.state);
    effect(() => {
      if (state() !== undefined) untracked(() => this.byHand.reload());
    });
  }

  protected choose(range: SecondsRange): void {
    this.selection.set(range);
  }

  protected setTime(edge: 'fromSeconds' | 'toSeconds', event: Event): void {
    if (!(event.target instanceof HTMLInputElement)) return;
    const seconds = secondsAt(this.clock(), event.target.value);
    if (seconds === null) return;
    const before = this.selection() ?? { fromSeconds: seconds, toSeconds: seconds };
    this.selection.set({ ...before, [edge]: seconds });
  }

  protected setReason(event: Event): void {
    if (event.target instanceof HTMLInputElement) this.reason.set(event.target.value);
  }

  protected async change(action: ChangeByHand['action']): Promise<void> {
    const range = this.selection();
    const reason = this.reason().trim();
    const fault = faultOf(range, reason);
    this.fault.set(fault);
    if (!range || fault !== null) return;
    this.busy.set(true);
    try {
      const after = await this.byHandApi.change(this.rigId(), this.runId(), {
        ...{ fromSeconds: range.fromSeconds, toSeconds: range.toSeconds },
        ...{ action, reason },
      });
      this.byHand.set(after);
      this.reason.set('');
      this.selection.set(null);
    } catch (error) {
      this.fault.set(sentenceOf(error));
    } finally {
      this.busy.set(false);
    }
  }
}

function faultOf(range: SecondsRange | null, reason: string): string | null {
  if (!range) return 'Select a stretch first: drag over the trace, or give its two times.';
  if (range.fromSeconds >= range.toSeconds) return 'The stretch has to end after it begins.';
  return reason === '' ? 'Say why in a few words: others see it too.' : null;
}
