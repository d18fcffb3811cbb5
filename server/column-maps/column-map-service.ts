import type { CreateColumnMap, SavedColumnMap } from '@stillpier/contract';
import type { Knex } from 'knex';
import { notFound } from '../http/app-error';
import { rigFor } from '../rigs/rig-access';
import { ColumnMapModel } from './column-map-model';

export class ColumnMapService {
  constructor(private readonly knex: Knex) {}

  async list(accountId: string, rigId: string): Promise<SavedColumnMap[]> {
    await rigFor(this.knex, accountId, rigId, 'see');
    return (await columnMapsOf(this.knex, rigId)).map(asColumnMap);
  }

  async one(accountId: string, rigId: string, mapId: string): Promise<SavedColumnMap> {
    await rigFor(this.knex, accountId, rigId, 'see');
    return asColumnMap(await this.columnMap(rigId, mapId));
  }

  async create(accountId: string, rigId: string, map: CreateColumnMap): Promise<SavedColumnMap> {
    await rigFor(this.knex, accountId, rigId, 'edit');
    const { id } = await ColumnMapModel.query(this.knex).insert({ ...map, rigId });
    return asColumnMap(await this.columnMap(rigId, id));
  }

  async remove(accountId: string, rigId: string, mapId: string): Promise<void> {
    await rigFor(this.knex, accountId, rigId, 'edit');
    const removed = await ColumnMapModel.query(this.knex).delete().where({ id: mapId, rigId });
    if (removed === 0) throw notFound('column map');
  }

  private async columnMap(rigId: string, mapId: string): Promise<ColumnMapModel> {
    const map = await ColumnMapModel.query(this.knex).findOne({ id: mapId, rigId });
    if (!map) throw notFound('column map');
    return map;
  }
}

/** Newest first: of two that fit a file the one that was saved last is meant. */
export function columnMapsOf(knex: Knex, rigId: string) {
  return ColumnMapModel.query(knex).where({ rigId }).orderBy('createdAt', 'desc').orderBy('id');
}

function asColumnMap(saved: ColumnMapModel): SavedColumnMap {
  const { id, rigId, name, headerCells, map, createdAt } = saved;
  return { id, rigId, name, headerCells, map, createdAt: createdAt.toISOString() };
}
