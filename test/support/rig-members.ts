import { rigPaths, rigSchema, type RIG_ROLES } from '@stillpier/contract';
import { type Agent, type TestApp } from './api-app';
import { EXAMPLE_RIG } from './example-rig';

export interface Cast {
  readonly owner: Agent;
  readonly operator: Agent;
  readonly advisor: Agent;
  readonly stranger: Agent;
  readonly steward: Agent;
  readonly nobody: Agent;
  readonly rigId: string;
}
export type Part = Exclude<keyof Cast, 'rigId'>;
export const PARTS: readonly Part[] = [
  ...(['owner', 'operator', 'advisor', 'stranger', 'steward', 'nobody'] as const),
];

/** A rig with an owner, an operator and an advisor, and those who have nothing to do with it. */
export async function castOf(app: TestApp): Promise<Cast> {
  const steward = await app.signedIn('steward@stillpier.test'); // the first account
  const owner = await app.signedIn('owner@stillpier.test');
  const operator = await app.signedIn('operator@stillpier.test');
  const advisor = await app.signedIn('advisor@stillpier.test');
  const stranger = await app.signedIn('stranger@stillpier.test');
  const created = await owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  const rigId = rigSchema.parse(created.body).id;
  await addMember(app, rigId, 'operator@stillpier.test', 'operator');
  await addMember(app, rigId, 'advisor@stillpier.test', 'advisor');
  return { owner, operator, advisor, stranger, steward, nobody: app.agent(), rigId };
}

async function addMember(
  app: TestApp,
  rigId: string,
  email: string,
  role: (typeof RIG_ROLES)[number],
): Promise<void> {
  const accountId = app.knex('accounts').where({ email }).select('id');
  await app.knex('rigMembers').insert({ rigId, accountId, role });
}
