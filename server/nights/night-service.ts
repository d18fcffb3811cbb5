import { nightSentence } from '@stillpier/analysis';
import type { Night, NightSummary, PageQuery } from '@stillpier/contract';
import type { Knex } from 'knex';
import * as z from 'zod';
import { notFound } from '../http/app-error';
import { readRequest } from '../http/read-request';
import { ImportModel } from '../imports/import-model';
import { rigFor } from '../rigs/rig-access';
import { asNightRun, asNightSummary, type RunWithSetup } from './night-answer';
import { NightModel } from './night-model';
import { RunModel } from './run-model';

const cursorSchema = z.object({ cursor: z.iso.date().optional() });

export class NightService {
  constructor(private readonly knex: Knex) {}

  /** Newest first; the cursor is the date of the last night that was seen. */
  async list(
    accountId: string,
    rigId: string,
    query: PageQuery,
  ): Promise<{ items: NightSummary[]; next: string | null }> {
    await rigFor(this.knex, accountId, rigId, 'see');
    const { cursor } = readRequest(cursorSchema, query);
    const nights = NightModel.query(this.knex).where({ rigId }).orderBy('date', 'desc');
    if (cursor !== undefined) void nights.where('date', '<', cursor);
    const rows = await nights.limit(query.limit + 1);
    const shown = rows.slice(0, query.limit);
    const next = rows.length > query.limit ? (shown.at(-1)?.date ?? null) : null;
    return { items: shown.map(asNightSummary), next };
  }

  async one(accountId: string, rigId: string, date: string): Promise<Night> {
    const rig = await rigFor(this.knex, accountId, rigId, 'see');
    const night = await NightModel.query(this.knex).findById([rigId, date]);
    if (!night) throw notFound('night');
    const runs = await this.runs(rigId, date);
    return {
      rigId,
      rigName: rig.name,
      timeZone: rig.site.timeZone,
      summary: asNightSummary(night),
      sentence: nightSentence(runs.map(({ run }) => run)),
      previous: await this.neighbour(rigId, '<', date),
      next: await this.neighbour(rigId, '>', date),
      runs: runs.map(asNightRun),
      logs: await this.logs([...new Set(runs.map(({ importId }) => importId))]),
    };
  }

  private async runs(rigId: string, date: string): Promise<RunWithSetup[]> {
    return RunModel.query(this.knex)
      .leftJoin('setups', 'setups.id', 'runs.setupId')
      .where({ 'runs.rigId': rigId, 'runs.night': date })
      .orderBy('runs.startsAt')
      .orderBy('runs.id')
      .select('runs.*', 'setups.name as setupName')
      .castTo<RunWithSetup[]>();
  }

  private async neighbour(rigId: string, side: '<' | '>', date: string): Promise<string | null> {
    const night = await NightModel.query(this.knex)
      .where({ rigId })
      .where('date', side, date)
      .orderBy('date', side === '<' ? 'desc' : 'asc')
      .first();
    return night?.date ?? null;
  }

  private async logs(importIds: string[]): Promise<Night['logs']> {
    const rows = await ImportModel.query(this.knex)
      .whereIn('id', importIds)
      .orderBy('createdAt')
      .select('id', 'fileName', 'analysisVersion', 'document');
    return rows.flatMap(({ id, fileName, analysisVersion, document }) =>
      document && analysisVersion !== null
        ? [{ importId: id, fileName, analysisVersion, reading: document.reading }]
        : [],
    );
  }
}
