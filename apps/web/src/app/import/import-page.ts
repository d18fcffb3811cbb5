import {
  ChangeDetectionStrategy,
  Component,
  computed,
  DestroyRef,
  effect,
  inject,
  input,
  linkedSignal,
  signal,
} from '@angular/core';
import { MatButton } from '@angular/material/button';
import { MatSnackBar } from '@angular/material/snack-bar';
import { RouterLink } from '@angular/router';
import { exportPaths, type LogImport } from '@stillpier/contract';
import { ColumnMapsApi } from '../api/column-maps-api';
import { ImportsApi } from '../api/imports-api';
import { sentenceOf } from '../api/problem-error';
import { RigsApi } from '../api/rigs-api';
import { SetupsApi } from '../api/setups-api';
import { countedText } from '../figures/measure-text';
import { Questions } from '../form/questions';
import { Emphasis } from '../page/emphasis';
import { Failure } from '../page/failure';
import { Waiting } from '../page/waiting';
import { DropZone } from './drop-zone';
import { EarlierImports } from './earlier-imports';
import { FileList } from './file-list';
import { ImportDesk, type DeskFile } from './import-desk';
import { importSentence } from './import-sentence';
import type { HandChoice } from './intake';
import { ReadingChoice } from './reading-choice';
import { ReadingNotes } from './reading-notes';

/** Adds guide logs to a rig: previewed in the page, sent, read by the worker, each step said. */
@Component({
  selector: 'app-import-page',
  imports: [
    DropZone,
    EarlierImports,
    Emphasis,
    Failure,
    FileList,
    MatButton,
    ReadingChoice,
    ReadingNotes,
    RouterLink,
    Waiting,
  ],
  providers: [ImportDesk],
  templateUrl: './import-page.html',
  styleUrl: './import-page.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
  host: { class: 'ruled', '(window:beforeunload)': 'warn($event)' },
})
export class ImportPage {
  private readonly importsApi = inject(ImportsApi);
  private readonly questions = inject(Questions);
  private readonly snackBar = inject(MatSnackBar);
  protected readonly desk = inject(ImportDesk);

  readonly rigId = input.required<string>();

  protected readonly rig = inject(RigsApi).one(this.rigId);
  protected readonly rigName = computed(() => (this.rig.hasValue() ? this.rig.value().name : ''));
  protected readonly role = computed(() => (this.rig.hasValue() ? this.rig.value().role : null));
  protected readonly setups = inject(SetupsApi).list(this.rigId);
  protected readonly setupChoices = computed(() =>
    this.setups.hasValue() ? this.setups.value() : [],
  );
  protected readonly setupId = linkedSignal(() => this.setupChoices()[0]?.id ?? null);
  protected readonly maps = inject(ColumnMapsApi).known(this.rigId);
  protected readonly archive = computed(() => exportPaths.rig(this.rigId()));
  protected readonly list = this.importsApi.list(this.rigId);
  /** As listed, and as the events have told since: what they told last wins over a list that is older. */
  private readonly imports = linkedSignal<readonly LogImport[], ReadonlyMap<string, LogImport>>({
    source: () => (this.list.hasValue() ? this.list.value() : []),
    computation: (listed, before) =>
      new Map(listed.map((each) => [each.id, before?.value.get(each.id) ?? each])),
  });
  protected readonly importById = this.imports.asReadonly();
  protected readonly earlier = computed(() =>
    [...this.imports().values()].sort((a, b) => b.createdAt.localeCompare(a.createdAt)),
  );

  private readonly selectedId = signal<number | null>(null);
  /** The file whose columns are shown: the chosen one, else the first that has a question. */
  protected readonly selected = computed((): DeskFile | null => {
    const files = this.desk.files();
    const chosen = files.find((file) => file.id === this.selectedId());
    return chosen ?? files.find((file) => file.intake?.preview && !file.ready) ?? files[0] ?? null;
  });
  /** What became of it on the server, once it has been read. */
  protected readonly selectedLog = computed(() => {
    const send = this.selected()?.send;
    const log = send?.at === 'received' ? this.imports().get(send.importId) : undefined;
    return log?.state === 'done' ? log : undefined;
  });
  protected readonly readyCount = computed(
    () => this.desk.files().filter((file) => file.ready && file.send === null).length,
  );
  protected readonly addText = computed(() =>
    this.readyCount() === 0
      ? `Add to ${this.rigName()}`
      : `Add ${countedText(this.readyCount(), 'file', 'files')} to ${this.rigName()}`,
  );
  protected readonly anySent = computed(() => this.desk.files().some(({ send }) => send !== null));
  protected readonly sentence = computed(() =>
    importSentence(this.desk.files(), this.imports(), this.rigName()),
  );

  constructor() {
    effect(() => {
      this.desk.savedMaps.set(this.maps.maps());
    });
    effect(() => {
      if (this.rig.hasValue()) this.desk.timeZone.set(this.rig.value().site.timeZone);
    });
    effect((onCleanup) => {
      const following = this.importsApi.follow(this.rigId()).subscribe((each) => {
        this.take(each);
      });
      onCleanup(() => {
        following.unsubscribe();
      });
    });
    inject(DestroyRef).onDestroy(() => {
      this.snackBar.dismiss();
    });
  }

  isSending(): boolean {
    return this.desk.sending();
  }

  protected warn(event: Event): void {
    if (this.isSending()) event.preventDefault();
  }

  protected select(id: number): void {
    this.selectedId.set(id);
  }

  protected choose(file: DeskFile, hand: HandChoice): void {
    this.selectedId.set(file.id); // a file that is ready now must not vanish under the hand
    this.desk.choose(file, hand);
  }

  protected chooseSetup(event: Event): void {
    if (event.target instanceof HTMLSelectElement) this.setupId.set(event.target.value);
  }

  protected send(): void {
    this.desk.sendAll(this.rigId(), this.setupId());
  }

  protected sendAgain(file: DeskFile): void {
    this.desk.sendAgain(this.rigId(), this.setupId(), file);
  }

  protected async readAgain(of: LogImport): Promise<void> {
    try {
      this.take(await this.importsApi.retry(of, {}));
    } catch (error) {
      // The import stays as it was; nothing on the page would say why.
      this.snackBar.open(`${of.fileName} is not read again. ${sentenceOf(error)}`, 'Close');
    }
  }

  /** Asked for twice: what hangs on the file goes with it. */
  protected async remove(of: LogImport): Promise<void> {
    const first = await this.questions.ask({
      title: `Delete ${of.fileName}?`,
      text: 'The original file goes, and with it the runs that it gave to its nights.',
      yes: 'Go on to delete',
      no: 'Keep it',
    });
    if (!first) return;
    const second = await this.questions.ask({
      title: `Delete ${of.fileName} for good?`,
      text: 'This cannot be taken back. Download the original first if it is kept nowhere else.',
      yes: 'Delete it for good',
      no: 'Keep it',
    });
    if (!second) return;
    try {
      await this.importsApi.remove(of);
    } catch (error) {
      this.snackBar.open(`${of.fileName} is not deleted. ${sentenceOf(error)}`, 'Close');
      return;
    }
    this.list.reload();
  }

  private take(each: LogImport): void {
    this.imports.update((known) => new Map(known).set(each.id, each));
  }
}
