import { type Rig, type RigState } from '@stillpier/contract';

interface Part {
  readonly text: string;
  readonly strong: boolean;
}

const WORDS = ['no', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten'];

/** The answer of the rigs page: what has to be done before the next clear night, and on which rig. */
export function rigsSentence(rigs: readonly Rig[], states: readonly RigState[]): readonly Part[] {
  if (states.every(({ lastNight }) => lastNight === null)) {
    return [plain('Add the first log, and this page will say what the mount did.')];
  }
  const toActOn = rigsAt('act', rigs, states);
  if (toActOn.length > 0) {
    const opening =
      rigs.length === 1
        ? 'Something is to be done before the next clear night on '
        : `${capital(inWords(toActOn.length))} of your ${inWords(rigs.length)} rigs ${toActOn.length === 1 ? 'needs' : 'need'} work before the next clear night: `;
    return [plain(opening), ...listed(toActOn), plain('.')];
  }
  const toWatch = rigsAt('watch', rigs, states);
  if (toWatch.length > 0) {
    const opening = 'Nothing has to be done before the next clear night; keep an eye on ';
    return [plain(opening), ...listed(toWatch), plain('.')];
  }
  return [plain('Nothing has to be done before the next clear night.')];
}

function rigsAt(
  severity: 'act' | 'watch',
  rigs: readonly Rig[],
  states: readonly RigState[],
): readonly string[] {
  const ids = states
    .filter(({ lastNight }) => lastNight?.mainLimit?.severity === severity)
    .map(({ rigId }) => rigId);
  return rigs.filter(({ id }) => ids.includes(id)).map(({ name }) => name);
}

function listed(names: readonly string[]): Part[] {
  return names.flatMap((name, i) => {
    const strong = { text: name, strong: true };
    if (i === 0) return [strong];
    return [plain(i === names.length - 1 ? ' and ' : ', '), strong];
  });
}

function plain(text: string): Part {
  return { text, strong: false };
}

function inWords(count: number): string {
  return WORDS[count] ?? String(count);
}

function capital(word: string): string {
  return word.charAt(0).toUpperCase() + word.slice(1);
}
