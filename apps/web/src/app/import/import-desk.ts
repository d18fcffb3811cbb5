import { computed, DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { LogImport, SavedColumnMap } from '@stillpier/contract';
import type { Subscription } from 'rxjs';
import { ImportsApi } from '../api/imports-api';
import { sentenceOf } from '../api/problem-error';
import { type ColumnChoice, intakeOf, lacksUnit, type Intake } from './intake';
import { guessStart, startTimeOf } from './log-start';

/** Enough for the preview and more: the first 256 KiB. */
const HEAD_BYTES = 262_144;

export interface PickedFile {
  readonly id: number;
  readonly file: File;
  /** null while its first bytes are read. */
  readonly head: Uint8Array | null;
}

export type SendState =
  | { readonly at: 'sending'; readonly share: number }
  | { readonly at: 'refused'; readonly sentence: string }
  | { readonly at: 'received'; readonly importId: string; readonly duplicate: boolean };

/** A file on the desk with all that is known of it. */
export interface DeskFile extends PickedFile {
  readonly intake: Intake | null;
  readonly startLocal: string;
  readonly startHint: string;
  readonly send: SendState | null;
  readonly ready: boolean;
}

/** The files that are being added: previewed here, then sent one after another. One desk a page. */
@Injectable()
export class ImportDesk {
  private readonly importsApi = inject(ImportsApi);
  private lastId = 0;
  private current: Subscription | null = null;

  readonly timeZone = signal('UTC');
  readonly savedMaps = signal<readonly SavedColumnMap[]>([]);
  private readonly picked = signal<readonly PickedFile[]>([]);
  /** By header line: files of one kind share what was chosen. */
  private readonly choices = signal<ReadonlyMap<string, readonly ColumnChoice[]>>(new Map());
  private readonly starts = signal<ReadonlyMap<number, string>>(new Map());
  private readonly sends = signal<ReadonlyMap<number, SendState>>(new Map());

  private readonly intakes = computed(
    () =>
      new Map(
        this.picked().flatMap(({ id, head }): [number, Intake][] => {
          if (!head) return [];
          const bare = intakeOf(head, this.savedMaps(), null);
          const chosen = this.choices().get(keyOf(bare));
          return [[id, chosen ? intakeOf(head, this.savedMaps(), chosen) : bare]];
        }),
      ),
  );

  readonly files = computed((): DeskFile[] =>
    this.picked().map((picked) => {
      const intake = this.intakes().get(picked.id) ?? null;
      const guess =
        intake?.preview && intake.needsStart
          ? guessStart(picked.file, intake.preview, intake.choices, this.timeZone())
          : null;
      const startLocal = this.starts().get(picked.id) ?? guess?.local ?? '';
      const send = this.sends().get(picked.id) ?? null;
      return {
        ...picked,
        intake,
        startLocal,
        startHint: guess?.hint ?? '',
        send,
        ready:
          intake !== null &&
          intake.fault === null &&
          intake.missing === null &&
          !intake.choices.some(lacksUnit) &&
          (!intake.needsStart || startTimeOf(startLocal, this.timeZone()) !== null),
      };
    }),
  );
  readonly sending = computed(() => this.files().some(({ send }) => send?.at === 'sending'));

  constructor() {
    inject(DestroyRef).onDestroy(() => this.current?.unsubscribe());
  }

  async add(files: readonly File[]): Promise<void> {
    const added = files.map((file): PickedFile => ({ id: ++this.lastId, file, head: null }));
    this.picked.update((before) => [...before, ...added]);
    for (const { id, file } of added) {
      const head = await firstBytes(file);
      if (head) this.replace(id, (picked) => ({ ...picked, head }));
      else this.mark(id, { at: 'refused', sentence: 'The file cannot be opened any more.' });
    }
  }

  remove(id: number): void {
    this.picked.update((files) => files.filter((file) => file.id !== id));
  }

  choose(file: DeskFile, column: number, choice: ColumnChoice): void {
    const { intake, head } = file;
    if (!intake || !head) return;
    const key = keyOf(intakeOf(head, this.savedMaps(), null));
    const chosen = intake.choices.map((before, i) => (i === column ? choice : before));
    this.choices.update((all) => new Map(all).set(key, chosen));
  }

  setStart(id: number, local: string): void {
    this.starts.update((all) => new Map(all).set(id, local));
  }

  /** Sends every file that is ready and not sent yet, one after another. */
  async sendAll(rigId: string, setupId: string | null): Promise<void> {
    for (;;) {
      const next = this.files().find((file) => file.ready && file.send === null);
      if (!next || this.sending()) return;
      await this.sendOne(rigId, setupId, next);
    }
  }

  /** A file that was refused goes once more. */
  async sendAgain(rigId: string, setupId: string | null, file: DeskFile): Promise<void> {
    await this.sendOne(rigId, setupId, file);
  }

  private sendOne(rigId: string, setupId: string | null, file: DeskFile): Promise<void> {
    const startTime = file.intake?.needsStart
      ? startTimeOf(file.startLocal, this.timeZone())
      : null;
    const map =
      startTime === null ? (file.intake?.map ?? null) : { ...file.intake?.map, startTime };
    this.mark(file.id, { at: 'sending', share: 0 });
    return new Promise((resolve) => {
      this.current = this.importsApi.upload(rigId, file.file, { setupId, map }).subscribe({
        next: (step) => {
          this.mark(
            file.id,
            'received' in step ? received(step.received) : { at: 'sending', share: step.share },
          );
        },
        error: (error: unknown) => {
          this.mark(file.id, { at: 'refused', sentence: sentenceOf(error) });
          resolve();
        },
        complete: resolve,
      });
    });
  }

  private mark(id: number, state: SendState): void {
    this.sends.update((all) => new Map(all).set(id, state));
  }

  private replace(id: number, change: (picked: PickedFile) => PickedFile): void {
    this.picked.update((files) => files.map((file) => (file.id === id ? change(file) : file)));
  }
}

function received({ id, duplicate }: LogImport): SendState {
  return { at: 'received', importId: id, duplicate };
}

function keyOf({ headerCells, preview }: Intake): string {
  return JSON.stringify([headerCells, preview?.columns.length ?? 0]);
}

/** null for a file that went away after it was picked. */
async function firstBytes(file: File): Promise<Uint8Array | null> {
  try {
    return new Uint8Array(await file.slice(0, HEAD_BYTES).arrayBuffer());
  } catch {
    return null; // the browser has no other way to say that the file is gone
  }
}
