import { type RIG_ROLES, type Mount, type Site } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

export type RigRole = (typeof RIG_ROLES)[number];

/** A mount at a site. `role` is there when the row was read through rig-access. */
export class RigModel extends BaseModel {
  static override readonly tableName = 'rigs';
  static override readonly jsonAttributes = ['mount', 'site'];
  declare name: string;
  declare mount: Mount;
  declare site: Site;
  declare version: number;
  declare createdAt: Date;
  declare role: RigRole;
}
