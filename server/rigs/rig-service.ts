import type { CreateRig, Rig } from '@stillpier/contract';
import type { Knex } from 'knex';
import { staleVersion } from '../http/app-error';
import { moveRunsToTheirNights } from '../nights/recompute-nights';
import { rigFor, rigsOf } from './rig-access';
import { RigMemberModel } from './rig-member-model';
import { RigModel } from './rig-model';

export class RigService {
  constructor(private readonly knex: Knex) {}

  async list(accountId: string): Promise<Rig[]> {
    const rigs = await rigsOf(this.knex, accountId).orderBy('rigs.createdAt').orderBy('rigs.id');
    return rigs.map(asRig);
  }

  async one(accountId: string, rigId: string): Promise<Rig> {
    return asRig(await rigFor(this.knex, accountId, rigId, 'see'));
  }

  /** Who describes a rig owns it. */
  async create(accountId: string, rig: CreateRig): Promise<Rig> {
    const rigId = await this.knex.transaction(async (trx) => {
      const { id } = await RigModel.query(trx).insert(rig);
      await RigMemberModel.query(trx).insert({ rigId: id, accountId, role: 'owner' });
      return id;
    });
    return this.one(accountId, rigId);
  }

  async update(accountId: string, rigId: string, version: number, rig: CreateRig): Promise<Rig> {
    await this.knex.transaction(async (trx) => {
      const before = await rigFor(trx, accountId, rigId, 'edit');
      const changed = await RigModel.query(trx)
        .where({ id: rigId, version })
        .patch({ ...rig, version: version + 1 });
      if (changed === 0) throw staleVersion();
      // Noon is the site's noon: with another time zone runs may belong to other evenings.
      if (before.site.timeZone !== rig.site.timeZone) {
        await moveRunsToTheirNights(trx, rigId, rig.site.timeZone);
      }
    });
    return this.one(accountId, rigId);
  }

  /** With everything that hangs on it: setups, imports and their originals, runs, nights. */
  async remove(accountId: string, rigId: string): Promise<void> {
    await rigFor(this.knex, accountId, rigId, 'own');
    await RigModel.query(this.knex).deleteById(rigId);
  }
}

function asRig({ id, name, mount, site, role, version, createdAt }: RigModel): Rig {
  return { id, name, mount, site, role, version, createdAt: createdAt.toISOString() };
}
