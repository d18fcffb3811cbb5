import { type Readable } from 'node:stream';
import { analyseLog, type AnalysisDocument } from '@stillpier/analysis';
import { columnMapSchema, rigDescriptionSchema } from '@stillpier/contract';
import { GuideLogError } from '@stillpier/guide-log';
import { readArguments } from './analyse-arguments';
import { readJsonFile } from './read-json-file';
import { readLogFile } from './read-log-file';
import { Unusable } from './unusable';

/** What a run of the command leaves: the document on standard output, or one sentence on standard error. */
export interface AnalyseOutcome {
  readonly exitCode: 0 | 2;
  readonly output: string;
  readonly complaint: string | null;
}

/**
 * The command `analyse`: one log to the analysis document, without a database.
 *
 * @param args The words after the command.
 * @param input Standard input, read when the file is `-`.
 */
export async function runAnalyse(
  args: readonly string[],
  input: Readable,
): Promise<AnalyseOutcome> {
  try {
    const document = await analyseFile(args, input);
    return { exitCode: 0, output: `${JSON.stringify(document, null, 2)}\n`, complaint: null };
  } catch (error) {
    if (error instanceof Unusable || error instanceof GuideLogError) {
      return { exitCode: 2, output: '', complaint: error.message };
    }
    throw error;
  }
}

async function analyseFile(args: readonly string[], input: Readable): Promise<AnalysisDocument> {
  const { file, mapFile, rigFile, subSeconds } = readArguments(args);
  const map = await readJsonFile('The column map', mapFile, columnMapSchema);
  const rig = await readJsonFile('The rig', rigFile, rigDescriptionSchema);
  const { frames, reading } = await readLogFile(file, input, map, rig.site?.timeZone);
  return analyseLog(frames, reading, rig, { subSeconds });
}
