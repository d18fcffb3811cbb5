import type { CreateColumnMap, OwnColumnMap, SavedColumnMap } from '@stillpier/contract';
import type { Knex } from 'knex';
import { notFound } from '../http/app-error';
import { rigFor, type RigRight } from '../rigs/rig-access';
import { ColumnMapModel } from './column-map-model';

/** Whose maps are meant: those of a rig, or with null those of the account itself. */
type OfRig = string | null;

export class ColumnMapService {
  constructor(private readonly knex: Knex) {}

  async list(accountId: string, ofRig: OfRig): Promise<(OwnColumnMap | SavedColumnMap)[]> {
    const owner = await this.owner(accountId, ofRig, 'see');
    return (await newestFirst(this.knex).where(owner)).map(asColumnMap);
  }

  async one(
    accountId: string,
    ofRig: OfRig,
    mapId: string,
  ): Promise<OwnColumnMap | SavedColumnMap> {
    const owner = await this.owner(accountId, ofRig, 'see');
    const map = await ColumnMapModel.query(this.knex).findOne({ id: mapId, ...owner });
    if (!map) throw notFound('column map');
    return asColumnMap(map);
  }

  async create(
    accountId: string,
    ofRig: OfRig,
    map: CreateColumnMap,
  ): Promise<OwnColumnMap | SavedColumnMap> {
    const owner = await this.owner(accountId, ofRig, 'edit');
    const { id } = await ColumnMapModel.query(this.knex).insert({ ...map, ...owner });
    return this.one(accountId, ofRig, id);
  }

  async remove(accountId: string, ofRig: OfRig, mapId: string): Promise<void> {
    const owner = await this.owner(accountId, ofRig, 'edit');
    const removed = await ColumnMapModel.query(this.knex)
      .delete()
      .where({ id: mapId, ...owner });
    if (removed === 0) throw notFound('column map');
  }

  private async owner(
    accountId: string,
    ofRig: OfRig,
    right: RigRight,
  ): Promise<{ rigId: string } | { accountId: string }> {
    if (ofRig === null) return { accountId };
    await rigFor(this.knex, accountId, ofRig, right);
    return { rigId: ofRig };
  }
}

/** The maps that are tried on a log, in that order: the rig's, then those of who sent it. */
export async function columnMapsFor(
  knex: Knex,
  rigId: string,
  accountId: string | null,
): Promise<ColumnMapModel[]> {
  const ofRig = await newestFirst(knex).where({ rigId });
  return accountId === null ? ofRig : [...ofRig, ...(await newestFirst(knex).where({ accountId }))];
}

/** Of two that fit a file the one that was saved last is meant. */
function newestFirst(knex: Knex) {
  return ColumnMapModel.query(knex).orderBy('createdAt', 'desc').orderBy('id');
}

function asColumnMap(saved: ColumnMapModel): OwnColumnMap | SavedColumnMap {
  const { id, rigId, name, headerCells, map, createdAt } = saved;
  const own = { id, name, headerCells, map, createdAt: createdAt.toISOString() };
  return rigId === null ? own : { ...own, rigId };
}
