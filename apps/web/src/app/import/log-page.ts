import {
  ChangeDetectionStrategy,
  Component,
  computed,
  effect,
  inject,
  input,
  linkedSignal,
} from '@angular/core';
import { RouterLink } from '@angular/router';
import type { LogImport, Reading } from '@stillpier/contract';
import { ImportsApi } from '../api/imports-api';
import { RigsApi } from '../api/rigs-api';
import { dayText, localDateTimeText } from '../figures/clock';
import { bytesText, countedText, countText } from '../figures/measure-text';
import { WaysOut } from '../night/ways-out';
import { Emphasis } from '../page/emphasis';
import { Failure } from '../page/failure';
import { saveFile } from '../page/save-file';
import { Severity } from '../page/severity';
import { Waiting } from '../page/waiting';
import { stateOfImport } from './file-list';
import { Progress } from './progress';
import { ReadAgain } from './read-again';
import { refusedCsv } from './refused-csv';

/** One log of a rig: what was read, what was left out and why, and reading it another way. */
@Component({
  selector: 'app-log-page',
  imports: [Emphasis, Failure, Progress, ReadAgain, RouterLink, Severity, Waiting, WaysOut],
  templateUrl: './log-page.html',
  styleUrl: './log-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled' },
})
export class LogPage {
  private readonly importsApi = inject(ImportsApi);

  readonly rigId = input.required<string>();
  readonly importId = input.required<string>();

  protected readonly loaded = this.importsApi.one(this.rigId, this.importId);
  protected readonly rig = inject(RigsApi).one(this.rigId);
  protected readonly mayUpload = inject(RigsApi).mayEdit(this.rigId);
  protected readonly timeZone = computed(() =>
    this.rig.hasValue() ? this.rig.value().site.timeZone : 'UTC',
  );
  protected readonly rigName = computed(() => (this.rig.hasValue() ? this.rig.value().name : ''));
  /** As loaded, then as the events tell. */
  protected readonly log = linkedSignal<LogImport | undefined>(() =>
    this.loaded.hasValue() ? this.loaded.value() : undefined,
  );
  /** The reading that stands: asked for again when another one has come to its end. */
  private readonly standing = computed(
    () => (this.log()?.state === 'done' ? this.log() : undefined),
    { equal: (a, b) => JSON.stringify(a) === JSON.stringify(b) },
  );
  protected readonly loadedReading = this.importsApi.reading(this.standing);
  protected readonly reading = linkedSignal<Reading | undefined, Reading | undefined>({
    source: () => (this.loadedReading.hasValue() ? this.loadedReading.value() : undefined),
    // The earlier lines stay until the new ones stand.
    computation: (read, before) => read ?? before?.value,
  });

  protected readonly state = computed(() => {
    const log = this.log();
    return log && stateOfImport(log);
  });
  protected readonly facts = computed(() => {
    const log = this.log();
    if (!log) return null;
    const local = localDateTimeText(Date.parse(log.createdAt), this.timeZone());
    return {
      added: `added ${dayText(local.slice(0, 10))}, ${local.slice(11, 16)}`,
      size: bytesText(log.sizeBytes),
    };
  });
  protected readonly sentence = computed(() => sentenceOf(this.log()));
  protected readonly lines = computed(() => {
    const read = this.reading();
    return (read?.refused ?? []).map(({ line, reason }) => ({ line: countText(line), reason }));
  });
  protected readonly further = computed(() => {
    const read = this.reading();
    return read ? read.refusedCount - read.refused.length : 0;
  });

  protected readonly day = dayText;
  protected readonly counted = (count: number): string => countedText(count, 'line', 'lines');

  constructor() {
    effect((onCleanup) => {
      const importId = this.importId();
      const following = this.importsApi.follow(this.rigId()).subscribe((each) => {
        if (each.id === importId) this.log.set(each);
      });
      onCleanup(() => {
        following.unsubscribe();
      });
    });
  }

  protected saveRefused(): void {
    const name = `${this.log()?.fileName ?? 'log'}.left-out.csv`;
    saveFile(name, refusedCsv(this.reading()?.refused ?? []), 'text/csv;charset=utf-8');
  }
}

function sentenceOf(log: LogImport | undefined) {
  const plain = (text: string) => ({ text, strong: false });
  const strong = (text: string) => ({ text, strong: true });
  if (!log) return [];
  if (log.state === 'failed') {
    return [strong(log.fileName), plain(' could not be read. '), plain(log.error ?? '')];
  }
  if (log.state !== 'done') {
    return [strong(log.fileName), plain(' is being read. What stood before stays until then.')];
  }
  const refused = log.refusedCount ?? 0;
  return [
    strong(countedText(log.frames ?? 0, 'frame', 'frames')),
    plain(' read from '),
    strong(countedText(log.lines ?? 0, 'line', 'lines')),
    plain(` of ${log.fileName}. `),
    ...(refused === 0
      ? [plain('No line was refused.')]
      : [strong(countedText(refused, 'line', 'lines')), plain(' could not be used.')]),
  ];
}
