import { parseArgs } from 'node:util';
import { Unusable } from './unusable';

const USAGE =
  'Use: npm run --silent analyse -- FILE.csv [--map MAP.json] [--rig RIG.json] [--sub-seconds N]';
const LONGEST_SUB_SECONDS = 3600;

export interface AnalyseArguments {
  /** `-` for standard input. */
  readonly file: string;
  readonly mapFile: string | undefined;
  readonly rigFile: string | undefined;
  readonly subSeconds: number | undefined;
}

export function readArguments(args: readonly string[]): AnalyseArguments {
  const { values, positionals } = parsed(args);
  const [file, ...more] = positionals;
  if (file === undefined) throw new Unusable(`No file was named. ${USAGE}`);
  if (more.length > 0) throw new Unusable(`Only one file can be read at a time. ${USAGE}`);
  return {
    file,
    mapFile: values.map,
    rigFile: values.rig,
    subSeconds: values['sub-seconds'] === undefined ? undefined : seconds(values['sub-seconds']),
  };
}

function parsed(args: readonly string[]) {
  try {
    return parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        map: { type: 'string' },
        rig: { type: 'string' },
        'sub-seconds': { type: 'string' },
      },
    });
  } catch {
    // parseArgs throws at words it does not know; its sentences speak to programmers.
    throw new Unusable(`The words after the command were not understood. ${USAGE}`);
  }
}

function seconds(text: string): number {
  const value = Number(text);
  if (text.trim() !== '' && value >= 1 && value <= LONGEST_SUB_SECONDS) return value;
  throw new Unusable(
    `--sub-seconds needs a number from 1 to ${LONGEST_SUB_SECONDS}, not "${text}".`,
  );
}
