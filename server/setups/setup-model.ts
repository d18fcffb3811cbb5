import { type CreateSetup, type Filter } from '@stillpier/contract';
import { BaseModel } from '../database/base-model';

/** Imaging scope and camera with guide scope and guide camera on a rig. */
export class SetupModel extends BaseModel {
  static override readonly tableName = 'setups';
  static override readonly jsonAttributes = ['imaging', 'filters', 'guiding'];
  declare rigId: string;
  declare name: string;
  declare imaging: CreateSetup['imaging'];
  declare filters: Filter[];
  declare guiding: CreateSetup['guiding'];
  declare seeingFwhmArcsec: number | null;
  declare subSeconds: number;
  declare keepAspect: number;
  declare version: number;
  declare createdAt: Date;
}
