import {
  ChangeDetectionStrategy,
  Component,
  computed,
  inject,
  input,
  linkedSignal,
  output,
  resource,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import type { LogImport, RetryImport } from '@stillpier/contract';
import { ColumnMapsApi } from '../api/column-maps-api';
import { ImportsApi } from '../api/imports-api';
import { sentenceOf } from '../api/problem-error';
import { SetupsApi } from '../api/setups-api';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { HEAD_BYTES } from './import-desk';
import { intakeOf, lacksUnit, NOTHING_BY_HAND } from './intake';
import { guessStart, startTimeOf } from './log-start';
import { ReadingChoice } from './reading-choice';
import { unpackedHead } from './unpacked-head';

/** Reads the kept original of a log once more: as before, or with other columns or another setup. */
@Component({
  selector: 'app-read-again',
  imports: [Failure, MatButton, ReadingChoice, Waiting],
  templateUrl: './read-again.html',
  styleUrl: './read-again.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class ReadAgain {
  private readonly importsApi = inject(ImportsApi);

  readonly log = input.required<LogImport>();
  readonly rigName = input.required<string>();
  readonly timeZone = input.required<string>();
  readonly started = output<LogImport>();

  protected readonly rigId = computed(() => this.log().rigId);
  protected readonly maps = inject(ColumnMapsApi).known(this.rigId);
  private readonly setups = inject(SetupsApi).list(this.rigId);
  protected readonly setupChoices = computed(() =>
    this.setups.hasValue() ? this.setups.value() : [],
  );
  protected readonly setupId = linkedSignal(() => this.log().setupId);
  protected readonly isBusy = computed(
    () => this.log().state === 'waiting' || this.log().state === 'running' || this.asking(),
  );
  private readonly asking = signal(false);
  protected readonly fault = signal<string | null>(null);

  /** Whether other columns are being chosen: the original is not looked at before. */
  protected readonly choosing = signal(false);
  protected readonly head = resource({
    params: () => (this.choosing() ? { rigId: this.rigId(), id: this.log().id } : undefined),
    loader: async ({ params }) =>
      unpackedHead(await this.importsApi.originalHead(params, HEAD_BYTES)),
  });
  protected readonly hand = signal(NOTHING_BY_HAND);
  protected readonly intake = computed(() =>
    this.head.hasValue() ? intakeOf(this.head.value(), this.maps.maps(), this.hand()) : null,
  );
  private readonly guess = computed(() => {
    const { fileName, createdAt, nights } = this.log();
    const intake = this.intake();
    const file = { name: fileName, lastModified: Date.parse(createdAt), night: nights[0] };
    return intake?.preview && intake.needsStart
      ? guessStart(file, intake.preview, intake.choices, this.timeZone())
      : null;
  });
  protected readonly startLocal = linkedSignal(() => this.guess()?.local ?? '');
  protected readonly startHint = computed(() => this.guess()?.hint ?? '');
  protected readonly isReady = computed(() => {
    const intake = this.intake();
    return (
      intake !== null &&
      intake.fault === null &&
      intake.missing === null &&
      !intake.choices.some(lacksUnit) &&
      (!intake.needsStart || startTimeOf(this.startLocal(), this.timeZone()) !== null)
    );
  });

  protected chooseSetup(event: Event): void {
    if (event.target instanceof HTMLSelectElement) this.setupId.set(event.target.value);
  }

  protected asBefore(): Promise<void> {
    return this.start({ setupId: this.setupId() });
  }

  protected asChosen(): Promise<void> {
    const intake = this.intake();
    const startTime = intake?.needsStart ? startTimeOf(this.startLocal(), this.timeZone()) : null;
    const map = startTime === null ? (intake?.map ?? null) : { ...intake?.map, startTime };
    return this.start({ setupId: this.setupId(), map });
  }

  private async start(changes: RetryImport): Promise<void> {
    this.asking.set(true);
    this.fault.set(null);
    try {
      this.started.emit(await this.importsApi.retry(this.log(), changes));
      this.choosing.set(false);
    } catch (error) {
      this.fault.set(sentenceOf(error));
    } finally {
      this.asking.set(false);
    }
  }
}
