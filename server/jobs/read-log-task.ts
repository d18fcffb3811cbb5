import { analyseLogWithSeries } from '@stillpier/analysis';
import { GuideLogError } from '@stillpier/guide-log';
import type { JobHelpers, Task } from 'graphile-worker';
import type { Knex } from 'knex';
import * as z from 'zod';
import { byHandOfLog } from '../by-hand/by-hand-service';
import { isDamagedGzip } from '../imports/unpacked';
import { RigModel } from '../rigs/rig-model';
import { SetupModel } from '../setups/setup-model';
import { describeRig } from './describe-rig';
import { ImportTurn, TakenOverError } from './import-turn';
import { readOriginal } from './read-original';
import type { ReadingLimits } from './reading-limits';
import { runOffsets, runsByHand } from './runs-by-hand';
import { storeAnalysis } from './store-analysis';
import { UnusableLogError } from './unusable-log-error';

const payloadSchema = z.object({ importId: z.uuid() });

/** Shares of the whole at which reading and analysing end; storing is the rest. */
const READ_SHARE = 0.6;
const ANALYSED_SHARE = 0.95;

const NO_DATE =
  'The log does not tell on which date it was written: give the time of its first frame in the column map (startTime).';
const DAMAGED = 'The file is compressed by gzip, and it is cut off or damaged.';
const FAULT =
  'The analysis of this file stopped with a fault of the program, three times; its log says which.';

interface ReadLogParts {
  readonly knex: Knex;
  readonly limits: ReadingLimits;
  readonly log: (message: string, error: unknown) => void;
}

/** The `read-log` task of the queue: from an original to runs, series, nights and the document. */
export function readLogTask({ knex, limits, log }: ReadLogParts): Task {
  return async (payload, helpers) => {
    const { importId } = payloadSchema.parse(payload);
    const turn = await ImportTurn.begin(knex, importId, helpers.job);
    if (!turn) return;
    try {
      await work(knex, limits, turn, helpers);
    } catch (error) {
      if (error instanceof TakenOverError) return;
      if (error instanceof GuideLogError || error instanceof UnusableLogError) {
        await turn.fail(error.message); // another try would read the same bytes
        return;
      }
      if (isDamagedGzip(error)) {
        await turn.fail(DAMAGED);
        return;
      }
      if (helpers.abortSignal.aborted) await turn.waitAgain('Waiting for its turn');
      else if (turn.isLast) await turn.fail(FAULT);
      else await turn.waitAgain('Waiting for another try');
      log(`Import ${importId}, try ${turn.row.attempt}`, error);
      throw error; // the queue counts it and comes again
    }
  };
}

async function work(
  knex: Knex,
  limits: ReadingLimits,
  turn: ImportTurn,
  { abortSignal }: JobHelpers,
): Promise<void> {
  const { rigId, setupId } = turn.row;
  const rig = await RigModel.query(knex).findById(rigId);
  if (!rig) throw new TakenOverError(`rig ${rigId} is gone`);
  const setup = setupId === null ? undefined : await SetupModel.query(knex).findById(setupId);

  const { frames, reading } = await readOriginal(
    knex,
    turn.row,
    rig.site.timeZone,
    limits,
    async (share) => {
      abortSignal.throwIfAborted();
      await turn.report(share * READ_SHARE, 'Reading the lines');
    },
  );
  if (frames.startEpochSeconds === null) throw new UnusableLogError(NO_DATE);

  await turn.report(READ_SHARE, 'Analysing the runs');
  const offsetsSeconds = runOffsets(frames);
  const byHand = runsByHand(offsetsSeconds, await byHandOfLog(knex, turn.row.id));
  const description = describeRig(rig, setup ?? null);
  const analysis = analyseLogWithSeries(frames, reading, description, { byHand });
  abortSignal.throwIfAborted();
  await turn.report(ANALYSED_SHARE, 'Keeping the results');
  const seeingFwhmArcsec = setup?.seeingFwhmArcsec ?? null;
  const correctionUnit = frames.raCorrection || frames.decCorrection ? frames.correctionUnit : null;
  const found = { analysis, offsetsSeconds, correctionUnit, seeingFwhmArcsec };
  await storeAnalysis(knex, turn, found);
}
