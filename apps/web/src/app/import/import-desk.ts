import { computed, DestroyRef, inject, Injectable, signal } from '@angular/core';
import type { LogImport } from '@stillpier/contract';
import type { Subscription } from 'rxjs';
import { ImportsApi } from '../api/imports-api';
import { sentenceOf } from '../api/problem-error';
import {
  type HandChoice,
  type Intake,
  intakeOf,
  type KnownMap,
  lacksUnit,
  NOTHING_BY_HAND,
} from './intake';
import { guessStart, startTimeOf } from './log-start';
import { unpackedHead } from './unpacked-head';

/** Enough for the preview and more: the first 256 KiB. */
export const HEAD_BYTES = 262_144;

export interface PickedFile {
  readonly id: number;
  readonly file: File;
  /** null while its first bytes are read. */
  readonly head: Uint8Array | null;
}

export type SendState =
  | { readonly at: 'queued'; readonly setupId: string | null }
  | { readonly at: 'sending'; readonly share: number }
  | { readonly at: 'stopped' }
  | { readonly at: 'refused'; readonly sentence: string }
  | { readonly at: 'received'; readonly importId: string; readonly duplicate: boolean };

/** A file on the desk with all that is known of it. */
export interface DeskFile extends PickedFile {
  readonly intake: Intake | null;
  readonly hand: HandChoice;
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
  private current: { readonly id: number; readonly upload: Subscription } | null = null;

  readonly timeZone = signal('UTC');
  readonly savedMaps = signal<readonly KnownMap[]>([]);
  private readonly picked = signal<readonly PickedFile[]>([]);
  /** By header line: files of one kind share what was chosen. */
  private readonly hands = signal<ReadonlyMap<string, HandChoice>>(new Map());
  private readonly starts = signal<ReadonlyMap<number, string>>(new Map());
  private readonly sends = signal<ReadonlyMap<number, SendState>>(new Map());

  private readonly intakes = computed(
    () =>
      new Map(
        this.picked().flatMap(({ id, head }): [number, [HandChoice, Intake]][] => {
          if (!head) return [];
          const hand = this.hands().get(keyOf(head)) ?? NOTHING_BY_HAND;
          return [[id, [hand, intakeOf(head, this.savedMaps(), hand)]]];
        }),
      ),
  );

  readonly files = computed((): DeskFile[] =>
    this.picked().map((picked) => {
      const [hand, intake] = this.intakes().get(picked.id) ?? [NOTHING_BY_HAND, null];
      const guess =
        intake?.preview && intake.needsStart
          ? guessStart(picked.file, intake.preview, intake.choices, this.timeZone())
          : null;
      const startLocal = this.starts().get(picked.id) ?? guess?.local ?? '';
      const send = this.sends().get(picked.id) ?? null;
      return {
        ...picked,
        intake,
        hand,
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
  readonly sending = computed(() =>
    this.files().some(({ send }) => send?.at === 'sending' || send?.at === 'queued'),
  );

  constructor() {
    inject(DestroyRef).onDestroy(() => this.current?.upload.unsubscribe());
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

  /** Of this file and of all with the same header line. */
  choose({ head }: DeskFile, hand: HandChoice): void {
    if (head) this.hands.update((all) => new Map(all).set(keyOf(head), hand));
  }

  setStart(id: number, local: string): void {
    this.starts.update((all) => new Map(all).set(id, local));
  }

  /** Files are sent one after another, in the order in which they were added. */
  sendAll(rigId: string, setupId: string | null): void {
    for (const { id, ready, send } of this.files()) {
      if (ready && send === null) this.mark(id, { at: 'queued', setupId });
    }
    void this.work(rigId);
  }

  /** A file that was refused or stopped goes once more. */
  sendAgain(rigId: string, setupId: string | null, { id }: DeskFile): void {
    this.mark(id, { at: 'queued', setupId });
    void this.work(rigId);
  }

  stop({ id }: DeskFile): void {
    this.mark(id, { at: 'stopped' });
    if (this.current?.id === id) this.current.upload.unsubscribe();
  }

  private async work(rigId: string): Promise<void> {
    while (this.current === null) {
      const next = this.files().find(({ send }) => send?.at === 'queued');
      if (next?.send?.at !== 'queued') return;
      await this.sendOne(rigId, next.send.setupId, next);
    }
  }

  private sendOne(rigId: string, setupId: string | null, file: DeskFile): Promise<void> {
    const { id, intake } = file;
    const startTime = intake?.needsStart ? startTimeOf(file.startLocal, this.timeZone()) : null;
    const map = startTime === null ? (intake?.map ?? null) : { ...intake?.map, startTime };
    this.mark(id, { at: 'sending', share: 0 });
    return new Promise((resolve) => {
      const upload = this.importsApi.upload(rigId, file.file, { setupId, map }).subscribe({
        next: (step) => {
          this.mark(
            id,
            'received' in step ? received(step.received) : { at: 'sending', share: step.share },
          );
        },
        error: (error: unknown) => {
          this.mark(id, { at: 'refused', sentence: sentenceOf(error) });
        },
      });
      this.current = { id, upload };
      // When it is sent, refused or stopped.
      upload.add(() => {
        this.current = null;
        resolve();
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

function keyOf(head: Uint8Array): string {
  const { headerCells, preview } = intakeOf(head, [], NOTHING_BY_HAND);
  return JSON.stringify([headerCells, preview?.columns.length ?? 0]);
}

/** null for a file that went away after it was picked. */
async function firstBytes(file: File): Promise<Uint8Array | null> {
  try {
    return await unpackedHead(new Uint8Array(await file.slice(0, HEAD_BYTES).arrayBuffer()));
  } catch {
    return null; // the browser has no other way to say that the file is gone
  }
}
