import { nightSentence } from '@stillpier/analysis';
import type { RigState } from '@stillpier/contract';
import type { Knex } from 'knex';
import { rigsOf } from '../rigs/rig-access';
import { asNightSummary } from './night-answer';
import { NightModel } from './night-model';
import { RunModel } from './run-model';

const TREND_NIGHTS = 12;

/** How each rig of an account stands after its last night: the rigs page. */
export class RigStateService {
  constructor(private readonly knex: Knex) {}

  async list(accountId: string): Promise<RigState[]> {
    const rigs = await rigsOf(this.knex, accountId).orderBy('rigs.createdAt').orderBy('rigs.id');
    return Promise.all(rigs.map(({ id }) => this.stateOf(id)));
  }

  private async stateOf(rigId: string): Promise<RigState> {
    const nights = NightModel.query(this.knex).where({ rigId });
    const nightCount = await nights.clone().resultSize();
    const latest = await nights.orderBy('date', 'desc').limit(TREND_NIGHTS);
    const last = latest[0];
    const runs = last ? await this.runsLongestFirst(rigId, last.date) : [];
    const longest = runs[0];
    return {
      rigId,
      nightCount,
      lastNight: last ? asNightSummary(last) : null,
      sentence: last
        ? nightSentence(runs.map(({ run }) => run))
        : [{ text: 'No logs yet.', strong: false }],
      footprint: longest?.run.footprint ?? null,
      seeingFwhmArcsec: longest?.seeingFwhmArcsec ?? null,
      imagingScaleArcsecPerPx: longest?.optics.imagingScaleArcsecPerPx ?? null,
      totalRmsTrend: latest
        .flatMap(({ date, totalRmsArcsec }) =>
          totalRmsArcsec === null ? [] : [{ date, totalRmsArcsec }],
        )
        .reverse(),
    };
  }

  private runsLongestFirst(rigId: string, night: string) {
    return RunModel.query(this.knex).where({ rigId, night }).orderBy('durationSeconds', 'desc');
  }
}
