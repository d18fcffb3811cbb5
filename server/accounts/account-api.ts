import {
  accountPaths,
  accountSchema,
  changePasswordSchema,
  confirmAccountSchema,
  mailSentSchema,
  renameAccountSchema,
  requestPasswordResetSchema,
  resetPasswordSchema,
  sessionSchema,
  signInSchema,
  signUpSchema,
} from '@stillpier/contract';
import type { Operation } from '../http/operation';

const open = { tag: 'Accounts', signedIn: false } as const;
const own = { tag: 'Accounts', signedIn: true } as const;
const mailSent = {
  202: {
    description: 'An e-mail follows; the same answer for known and unknown addresses',
    schema: mailSentSchema,
  },
};

export const accountApi: readonly Operation[] = [
  {
    ...open,
    method: 'post',
    path: accountPaths.accounts,
    summary: 'Sign up; the account exists once its address is confirmed',
    body: { schema: signUpSchema },
    answers: mailSent,
    problems: [400, 403, 429],
  },
  {
    ...open,
    method: 'post',
    path: accountPaths.confirmations,
    summary: 'Confirm an address with the token of its e-mail',
    body: { schema: confirmAccountSchema },
    answers: { 201: { description: 'The account', schema: accountSchema } },
    problems: [400, 403, 422, 429],
  },
  {
    ...open,
    method: 'get',
    path: accountPaths.session,
    summary: 'Who is signed in',
    answers: { 200: { description: 'The account, or null', schema: sessionSchema } },
    problems: [],
  },
  {
    ...open,
    method: 'post',
    path: accountPaths.session,
    summary: 'Sign in',
    body: { schema: signInSchema },
    answers: { 200: { description: 'The session, with a new cookie', schema: sessionSchema } },
    problems: [400, 401, 403, 429],
  },
  {
    ...open,
    method: 'delete',
    path: accountPaths.session,
    summary: 'Sign out',
    answers: { 204: { description: 'Signed out' } },
    problems: [403],
  },
  {
    ...own,
    method: 'get',
    path: accountPaths.account,
    summary: 'The own account',
    answers: { 200: { description: 'The account', schema: accountSchema } },
    problems: [401],
  },
  {
    ...own,
    method: 'patch',
    path: accountPaths.account,
    summary: 'Change the own name',
    body: { schema: renameAccountSchema },
    answers: { 200: { description: 'The account', schema: accountSchema } },
    problems: [400, 401, 403],
  },
  {
    ...own,
    method: 'put',
    path: accountPaths.password,
    summary: 'Change the own password; every other session of the account ends',
    body: { schema: changePasswordSchema },
    answers: { 204: { description: 'Changed' } },
    problems: [400, 401, 403, 429],
  },
  {
    ...open,
    method: 'post',
    path: accountPaths.passwordResets,
    summary: 'Ask for a link that sets a new password',
    body: { schema: requestPasswordResetSchema },
    answers: mailSent,
    problems: [400, 403, 429],
  },
  {
    ...open,
    method: 'put',
    path: accountPaths.passwordResets,
    summary: 'Set a new password with the token of the e-mail; every session of the account ends',
    body: { schema: resetPasswordSchema },
    answers: { 204: { description: 'Changed' } },
    problems: [400, 403, 422, 429],
  },
];
