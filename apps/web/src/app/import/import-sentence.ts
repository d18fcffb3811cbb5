import type { LogImport } from '@stillpier/contract';
import { countedText } from '../figures/measure-text';
import type { DeskFile } from './import-desk';

interface Part {
  readonly text: string;
  readonly strong: boolean;
}

const plain = (text: string): Part => ({ text, strong: false });
const strong = (text: string): Part => ({ text, strong: true });

/** What was read, or what is still to be answered, at the top of the page. */
export function importSentence(
  files: readonly DeskFile[],
  imports: ReadonlyMap<string, LogImport>,
  rigName: string,
): Part[] {
  if (files.length === 0) {
    return [plain(rigName === '' ? 'Add guide logs.' : `Add guide logs to ${rigName}.`)];
  }
  const sent = files.filter(({ send }) => send !== null && send.at !== 'stopped');
  return sent.length === 0 ? beforeSending(files) : afterSending(sent, imports);
}

function beforeSending(files: readonly DeskFile[]): Part[] {
  const ready = files.filter((file) => file.ready).length;
  const asking = files.filter((file) => !file.ready && file.intake?.preview).length;
  const unreadable = files.filter(({ intake }) => intake && intake.fault !== null).length;
  return [
    strong(`${ready} of ${countedText(files.length, 'file', 'files')}`),
    plain(' can be added as they are.'),
    ...(asking > 0
      ? [strong(` ${asking}`), plain(asking === 1 ? ' has a question.' : ' have a question.')]
      : []),
    ...(unreadable > 0 ? [strong(` ${unreadable}`), plain(' cannot be read.')] : []),
  ];
}

function afterSending(sent: readonly DeskFile[], imports: ReadonlyMap<string, LogImport>): Part[] {
  const known = sent.flatMap(({ send }) =>
    send?.at === 'received' && !send.duplicate ? (imports.get(send.importId) ?? []) : [],
  );
  const done = known.filter(({ state }) => state === 'done');
  const frames = done.reduce((sum, each) => sum + (each.frames ?? 0), 0);
  const refused = done.reduce((sum, each) => sum + (each.refusedCount ?? 0), 0);
  const open =
    sent.filter(({ send }) => send?.at === 'sending' || send?.at === 'queued').length +
    working(known);
  return [
    ...(done.length > 0
      ? [
          strong(countedText(frames, 'frame', 'frames')),
          plain(' read from '),
          strong(countedText(done.length, 'file', 'files')),
          plain('.'),
        ]
      : []),
    ...(refused > 0
      ? [strong(` ${countedText(refused, 'line', 'lines')}`), plain(' could not be used.')]
      : []),
    ...(open > 0 ? [plain(` ${countedText(open, 'file', 'files')} on the way.`)] : []),
    ...(done.length === 0 && open === 0 ? [plain('Nothing new was read.')] : []),
  ];
}

function working(imports: readonly LogImport[]): number {
  return imports.filter(({ state }) => state === 'waiting' || state === 'running').length;
}
