import type { Knex } from 'knex';
import { forbidden, notFound } from '../http/app-error';
import { RigModel, type RigRole } from './rig-model';

/** What somebody wants to do on a rig; the table of rights is PRODUCT's. */
export type RigRight = 'see' | 'upload' | 'setAside' | 'edit' | 'own';

const ROLES_WITH: Record<RigRight, readonly RigRole[]> = {
  see: ['owner', 'operator', 'advisor'],
  upload: ['owner', 'operator'],
  setAside: ['owner', 'operator'],
  edit: ['owner', 'operator'],
  own: ['owner'],
};

const REFUSALS: Record<RigRight, string> = {
  see: '',
  upload: 'Only the owner and the operators of this rig may add or remove logs.',
  setAside: 'Only the owner and the operators of this rig may set frames aside.',
  edit: 'Only the owner and the operators of this rig may change it.',
  own: 'Only the owner of this rig may do that.',
};

/** The rigs that an account is a member of, each with its role: every query on rigs starts here. */
export function rigsOf(knex: Knex, accountId: string) {
  return RigModel.query(knex)
    .join('rigMembers', 'rigMembers.rigId', 'rigs.id')
    .where('rigMembers.accountId', accountId)
    .select('rigs.*', 'rigMembers.role');
}

/**
 * The rig, if the account may do this on it. Whoever is no member gets 404, the steward too, so that nothing is told
 * about what exists; a member, who sees the rig anyway, gets 403 with the reason.
 */
export async function rigFor(
  knex: Knex,
  accountId: string,
  rigId: string,
  right: RigRight,
): Promise<RigModel> {
  const rig = await rigsOf(knex, accountId).findOne('rigs.id', rigId);
  if (!rig) throw notFound('rig');
  if (!ROLES_WITH[right].includes(rig.role)) throw forbidden(REFUSALS[right]);
  return rig;
}
