import type { CreateSetup, Setup } from '@stillpier/contract';
import type { Knex } from 'knex';
import { notFound, staleVersion } from '../http/app-error';
import { rigFor } from '../rigs/rig-access';
import { SetupModel } from './setup-model';

export class SetupService {
  constructor(private readonly knex: Knex) {}

  /** Oldest first: the first one is the rig's usual setup. */
  async list(accountId: string, rigId: string): Promise<Setup[]> {
    await rigFor(this.knex, accountId, rigId, 'see');
    return (await setupsOf(this.knex, rigId)).map(asSetup);
  }

  async one(accountId: string, rigId: string, setupId: string): Promise<Setup> {
    await rigFor(this.knex, accountId, rigId, 'see');
    return asSetup(await this.setup(rigId, setupId));
  }

  async create(accountId: string, rigId: string, setup: CreateSetup): Promise<Setup> {
    await rigFor(this.knex, accountId, rigId, 'edit');
    const { id } = await SetupModel.query(this.knex).insert({ ...setup, rigId });
    return asSetup(await this.setup(rigId, id));
  }

  async update(
    accountId: string,
    rigId: string,
    setupId: string,
    version: number,
    setup: CreateSetup,
  ): Promise<Setup> {
    await rigFor(this.knex, accountId, rigId, 'edit');
    await this.setup(rigId, setupId);
    const changed = await SetupModel.query(this.knex)
      .where({ id: setupId, version })
      .patch({ ...setup, version: version + 1 });
    if (changed === 0) throw staleVersion();
    return asSetup(await this.setup(rigId, setupId));
  }

  /** Runs that were guided with it stay, with what was known of it when they were analysed. */
  async remove(accountId: string, rigId: string, setupId: string): Promise<void> {
    await rigFor(this.knex, accountId, rigId, 'edit');
    const removed = await SetupModel.query(this.knex).delete().where({ id: setupId, rigId });
    if (removed === 0) throw notFound('setup');
  }

  private async setup(rigId: string, setupId: string): Promise<SetupModel> {
    const setup = await SetupModel.query(this.knex).findOne({ id: setupId, rigId });
    if (!setup) throw notFound('setup');
    return setup;
  }
}

export function setupsOf(knex: Knex, rigId: string) {
  return SetupModel.query(knex).where({ rigId }).orderBy('createdAt').orderBy('id');
}

function asSetup(setup: SetupModel): Setup {
  const { id, rigId, name, imaging, filters, guiding, version } = setup;
  const { seeingFwhmArcsec, subSeconds, keepAspect } = setup;
  return {
    ...{ id, rigId, name, imaging, filters, guiding, version },
    ...{ seeingFwhmArcsec, subSeconds, keepAspect },
    createdAt: setup.createdAt.toISOString(),
  };
}
