import {
  accessTokenPaths,
  accessTokenSchema,
  createAccessTokenSchema,
  newAccessTokenSchema,
  updateAccessTokenSchema,
} from '@stillpier/contract';
import * as z from 'zod';
import type { Operation } from '../http/operation';

const about = { tag: 'Tokens', signedIn: true } as const;
const all = { ...about, path: accessTokenPaths.all } as const;
const one = {
  ...about,
  path: accessTokenPaths.one('{tokenId}'),
  params: z.object({ tokenId: z.uuid() }),
} as const;

export const accessTokenApi: readonly Operation[] = [
  {
    ...all,
    method: 'get',
    summary: 'The tokens of the account, oldest first; none shows the token itself',
    answers: { 200: { description: 'The tokens', schema: z.array(accessTokenSchema) } },
    problems: [401],
  },
  {
    ...all,
    method: 'post',
    summary: 'Make a token for a program; the answer shows it this once',
    body: { schema: createAccessTokenSchema },
    answers: { 201: { description: 'The token', schema: newAccessTokenSchema } },
    problems: [400, 401, 403, 409],
  },
  {
    ...one,
    method: 'patch',
    summary: 'Change the name of a token, or when e-mails tell about its logs',
    body: { schema: updateAccessTokenSchema },
    answers: { 200: { description: 'The token', schema: accessTokenSchema } },
    problems: [400, 401, 403, 404],
  },
  {
    ...one,
    method: 'delete',
    summary: 'Revoke a token',
    answers: { 204: { description: 'Revoked' } },
    problems: [400, 401, 403, 404],
  },
];
