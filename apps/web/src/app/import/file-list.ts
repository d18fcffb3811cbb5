import { ChangeDetectionStrategy, Component, computed, input, output } from '@angular/core';
import { MatButton } from '@angular/material/button';
import { RouterLink } from '@angular/router';
import type { LogImport } from '@stillpier/contract';
import { dayText } from '../figures/clock';
import { bytesText, countText } from '../figures/measure-text';
import { Severity } from '../page/severity';
import type { DeskFile } from './import-desk';
import { lacksUnit } from './intake';
import { Progress } from './progress';

interface FileState {
  readonly level: 'fine' | 'watch' | 'act' | null;
  readonly words: string;
  readonly sentence: string | null;
  readonly share: number | null;
  /** Whether trying once more may help: as an upload, or as the reading of the kept original. */
  readonly again: 'send' | 'read' | null;
  readonly nights: readonly string[];
}

/** The files that are being added, each with what has become of it. */
@Component({
  selector: 'app-file-list',
  imports: [MatButton, Progress, RouterLink, Severity],
  templateUrl: './file-list.html',
  styleUrl: './file-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileList {
  readonly rigId = input.required<string>();
  readonly files = input.required<readonly DeskFile[]>();
  readonly imports = input.required<ReadonlyMap<string, LogImport>>();
  readonly selectedId = input.required<number | null>();
  readonly selected = output<number>();
  readonly removed = output<number>();
  readonly stopped = output<DeskFile>();
  readonly sendAgain = output<DeskFile>();
  readonly readAgain = output<LogImport>();

  protected readonly rows = computed(() =>
    this.files().map((file) => {
      const { send } = file;
      const of = send?.at === 'received' ? this.imports().get(send.importId) : undefined;
      return {
        file,
        of,
        name: file.file.name,
        size: bytesText(file.file.size),
        state: stateOf(file, of),
        canGo: send === null || send.at === 'refused' || send.at === 'stopped',
        canStop: send?.at === 'queued' || send?.at === 'sending',
      };
    }),
  );

  protected readonly day = dayText;
}

const NOTHING = { level: null, sentence: null, share: null, again: null, nights: [] } as const;

function stateOf(file: DeskFile, of: LogImport | undefined): FileState {
  const { send } = file;
  switch (send?.at) {
    case undefined:
      return stateBeforeSending(file);
    case 'queued':
      return { ...NOTHING, words: 'Waiting to be sent' };
    case 'stopped':
      return { ...NOTHING, words: 'Stopped before it had arrived', again: 'send' };
    case 'sending':
      return { ...NOTHING, words: 'Sending', share: send.share };
    case 'refused':
      return {
        ...NOTHING,
        level: 'act',
        words: 'Not sent',
        sentence: send.sentence,
        again: 'send',
      };
    case 'received':
      if (!of) return { ...NOTHING, words: 'Received' };
      return send.duplicate ? duplicateOf(of) : stateOfImport(of);
  }
}

function stateBeforeSending({ intake, ready }: DeskFile): FileState {
  if (!intake) return { ...NOTHING, words: 'Reading' };
  if (intake.fault !== null) {
    return { ...NOTHING, level: 'act', words: 'Cannot be read', sentence: intake.fault };
  }
  if (ready) {
    const with_ = intake.savedMap ? `With the map ${intake.savedMap.name}.` : null;
    return { ...NOTHING, level: 'fine', words: 'Ready', sentence: with_ };
  }
  const open = intake.choices.some(lacksUnit) ? 'Units to name' : 'Columns to name';
  return intake.missing === null
    ? { ...NOTHING, level: 'watch', words: 'Start time to give' }
    : { ...NOTHING, level: 'watch', words: open, sentence: intake.missing };
}

function duplicateOf(of: LogImport): FileState {
  const sentence = `The rig has had this file since ${dayText(of.createdAt.slice(0, 10))}; it counts once.`;
  return { ...NOTHING, level: 'fine', words: 'Known already', sentence, nights: of.nights };
}

export function stateOfImport(of: LogImport): FileState {
  switch (of.state) {
    case 'waiting':
    case 'running':
      return { ...NOTHING, words: of.stage, share: of.progress };
    case 'failed':
      return { ...NOTHING, level: 'act', words: 'Failed', sentence: of.error, again: 'read' };
    case 'done': {
      const frames = `${countText(of.frames ?? 0)} frames`;
      const refused = of.refusedCount ?? 0;
      return refused === 0
        ? { ...NOTHING, level: 'fine', words: 'Read', sentence: frames, nights: of.nights }
        : {
            ...NOTHING,
            level: 'watch',
            words: `Read, ${countText(refused)} ${refused === 1 ? 'line' : 'lines'} refused`,
            sentence: frames,
            nights: of.nights,
          };
    }
  }
}
