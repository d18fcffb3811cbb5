import type { Knex } from 'knex';
import { raw } from 'objection';
import { RigModel } from '../rigs/rig-model';
import { nightDateOf } from './night-date';
import { NightModel } from './night-model';
import { RunModel } from './run-model';
import { type MeasuredRun, RUN_MEASURES, summariseNight } from './summarise-night';

/**
 * Whoever changes runs holds the rig first: two imports that end at once would each miss the other's runs in the
 * night that both belong to. Answers the rig as it now is, or undefined when it is gone.
 */
export function holdRig(trx: Knex.Transaction, rigId: string) {
  return RigModel.query(trx).findById(rigId).forNoKeyUpdate();
}

/** Writes the measures of some nights anew from their runs; a night without runs goes. Needs `holdRig`. */
export async function recomputeNights(
  trx: Knex.Transaction,
  rigId: string,
  dates: Iterable<string>,
): Promise<void> {
  for (const date of new Set(dates)) {
    const runs = await RunModel.query(trx)
      .where({ rigId, night: date })
      .orderBy('startsAt')
      .orderBy('id')
      .select(...RUN_MEASURES, raw(`run -> 'findings'`).as('findings'))
      .castTo<MeasuredRun[]>();
    if (runs.length === 0) await NightModel.query(trx).delete().where({ rigId, date });
    else {
      await NightModel.query(trx)
        .insert({ rigId, date, ...summariseNight(runs) })
        .onConflict(['rigId', 'date'])
        .merge();
    }
  }
}

/** Gives every run of a rig to the night that it belongs to in a time zone. Needs `holdRig`. */
export async function moveRunsToTheirNights(
  trx: Knex.Transaction,
  rigId: string,
  timeZone: string,
): Promise<void> {
  const runs = await RunModel.query(trx).where({ rigId }).select('id', 'night', 'startsAt');
  const moved = runs.flatMap(({ id, night: from, startsAt }) => {
    const night = nightDateOf(startsAt, timeZone);
    return night === from ? [] : [{ id, from, night }];
  });
  for (const { id, night } of moved) await RunModel.query(trx).findById(id).patch({ night });
  await recomputeNights(
    trx,
    rigId,
    moved.flatMap(({ from, night }) => [from, night]),
  );
}
