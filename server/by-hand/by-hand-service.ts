import type { ByHand, ChangeByHand } from '@stillpier/contract';
import type { Knex } from 'knex';
import { AppError, badInput, conflict, notFound } from '../http/app-error';
import { ImportModel } from '../imports/import-model';
import { startReading } from '../imports/start-reading';
import { RunModel } from '../nights/run-model';
import { rigFor } from '../rigs/rig-access';
import { ByHandEntryModel } from './by-hand-entry-model';
import { overlaps, type Stretch, stretchesAfter } from './stretches';

/** So that a stretch which reaches the end of a run holds its last frame, and nothing of the run after it. */
const BEYOND_LAST_FRAME_SECONDS = 0.001;

type RunInLog = Pick<RunModel, 'importId' | 'logOffsetSeconds' | 'durationSeconds'>;
type Entry = ByHandEntryModel & { readonly name: string | null };

/** What people set aside of the runs of a rig. */
export class ByHandService {
  constructor(private readonly knex: Knex) {}

  async of(accountId: string, rigId: string, runId: string): Promise<ByHand> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const run = await runInLog(this.knex, rigId, runId);
    return asByHand(run, await entriesOf(this.knex, run.importId));
  }

  /** The figures of the log are computed anew by the queue; the old ones stay until those stand. */
  async change(
    accountId: string,
    rigId: string,
    runId: string,
    change: ChangeByHand,
  ): Promise<ByHand> {
    await rigFor(this.knex, accountId, rigId, 'setAside');
    await this.knex.transaction(async (trx) => {
      const run = await runInLog(trx, rigId, runId);
      const row = await ImportModel.query(trx).findById(run.importId).forUpdate();
      if (!row) throw notFound('run');
      if (row.state === 'failed') {
        const detail = 'The last reading of this log failed: read it again with another map first.';
        throw conflict('not-read', detail);
      }
      const stretch = inLog(run, change);
      if (change.action === 'take back') await requireOverlap(trx, run.importId, stretch);
      await ByHandEntryModel.query(trx).insert({
        ...{ importId: run.importId, madeBy: accountId },
        ...{ action: change.action, reason: change.reason },
        ...{ fromLogSeconds: stretch.fromSeconds, toLogSeconds: stretch.toSeconds },
      });
      await startReading(trx, row, { setupId: row.setupId, map: row.map, mail: null });
    });
    return this.of(accountId, rigId, runId);
  }
}

/** What is set aside by hand of a log, in seconds since its first frame. */
export async function byHandOfLog(knex: Knex, importId: string): Promise<Stretch[]> {
  const entries = await ByHandEntryModel.query(knex).where({ importId }).orderBy('position');
  return stretchesAfter(
    entries.map(({ action, fromLogSeconds, toLogSeconds }) => ({
      action,
      fromSeconds: fromLogSeconds,
      toSeconds: toLogSeconds,
    })),
  );
}

async function runInLog(knex: Knex, rigId: string, runId: string): Promise<RunInLog> {
  const run = await RunModel.query(knex)
    .findOne({ id: runId, rigId })
    .select('importId', 'logOffsetSeconds', 'durationSeconds');
  if (!run) throw notFound('run');
  return run;
}

function entriesOf(knex: Knex, importId: string) {
  return ByHandEntryModel.query(knex)
    .leftJoin('accounts', 'accounts.id', 'byHandEntries.madeBy')
    .where({ importId })
    .orderBy('position')
    .select('byHandEntries.*', 'accounts.name')
    .castTo<Entry[]>();
}

function inLog(run: RunInLog, { fromSeconds, toSeconds }: Stretch): Stretch {
  if (fromSeconds > run.durationSeconds) {
    const message = 'lies behind the end of the run';
    throw badInput('The stretch cannot be used.', [{ path: 'fromSeconds', message }]);
  }
  const end = Math.min(toSeconds, run.durationSeconds + BEYOND_LAST_FRAME_SECONDS);
  return {
    fromSeconds: run.logOffsetSeconds + fromSeconds,
    toSeconds: run.logOffsetSeconds + end,
  };
}

async function requireOverlap(trx: Knex, importId: string, stretch: Stretch): Promise<void> {
  const now = await byHandOfLog(trx, importId);
  if (now.some((each) => overlaps(each, stretch))) return;
  throw new AppError(422, 'nothing-by-hand', 'Nobody has set anything in this stretch aside.');
}

function asByHand(run: RunInLog, entries: readonly Entry[]): ByHand {
  const { importId, logOffsetSeconds, durationSeconds } = run;
  const inRun = ({ fromSeconds, toSeconds }: Stretch): Stretch => ({
    fromSeconds: Math.max(0, fromSeconds - logOffsetSeconds),
    toSeconds: Math.min(toSeconds - logOffsetSeconds, durationSeconds + BEYOND_LAST_FRAME_SECONDS),
  });
  const ofRun = { fromSeconds: 0, toSeconds: durationSeconds + BEYOND_LAST_FRAME_SECONDS };
  const all = entries.map((entry) => ({
    entry,
    ...inRun({ fromSeconds: entry.fromLogSeconds, toSeconds: entry.toLogSeconds }),
  }));
  const about = all.filter((each) => overlaps(each, ofRun));
  return {
    importId,
    stretches: stretchesAfter(
      about.map(({ entry, ...each }) => ({ ...each, action: entry.action })),
    ),
    history: about
      .map(({ entry: { id, action, reason, name, createdAt }, fromSeconds, toSeconds }) => ({
        ...{ id, action, fromSeconds, toSeconds, reason },
        by: name,
        at: createdAt.toISOString(),
      }))
      .reverse(),
  };
}
