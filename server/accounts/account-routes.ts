import {
  accountPaths,
  changePasswordSchema,
  confirmAccountSchema,
  type MailSent,
  renameAccountSchema,
  requestPasswordResetSchema,
  resetPasswordSchema,
  signUpSchema,
} from '@stillpier/contract';
import { type Request, Router } from 'express';
import { addressOf, type Limits } from '../http/limits';
import { readRequest } from '../http/read-request';
import { requireAccount } from '../http/signed-in';
import { type AccountService, toAccount } from './account-service';

export interface AccountParts {
  readonly accounts: AccountService;
  readonly limits: Limits;
  /** Where the local mail catcher shows its mails; null when they leave the machine. */
  readonly localMailUrl: string | null;
}

export function accountRoutes({ accounts, limits, localMailUrl }: AccountParts): Router {
  const router = Router();

  router.post(accountPaths.accounts, async (req, res) => {
    const signUp = readRequest(signUpSchema, req.body);
    await takeMail(limits, req, signUp.email);
    await accounts.signUp(signUp);
    res.status(202).json(mailSent(localMailUrl));
  });
  router.post(accountPaths.confirmations, async (req, res) => {
    const { token } = readRequest(confirmAccountSchema, req.body);
    await limits.take('tokenByAddress', addressOf(req));
    res.status(201).json(await accounts.confirm(token));
  });

  router.get(accountPaths.account, (req, res) => {
    res.json(toAccount(requireAccount(req)));
  });
  router.patch(accountPaths.account, async (req, res) => {
    const { id } = requireAccount(req);
    const { name } = readRequest(renameAccountSchema, req.body);
    res.json(await accounts.rename(id, name));
  });
  router.put(accountPaths.password, async (req, res) => {
    const account = requireAccount(req);
    const change = readRequest(changePasswordSchema, req.body);
    await limits.take('signInByEmail', account.email);
    await accounts.changePassword(account, change, req.sessionID);
    res.status(204).end();
  });

  router.post(accountPaths.passwordResets, async (req, res) => {
    const { email } = readRequest(requestPasswordResetSchema, req.body);
    await takeMail(limits, req, email);
    await accounts.requestPasswordReset(email);
    res.status(202).json(mailSent(localMailUrl));
  });
  router.put(accountPaths.passwordResets, async (req, res) => {
    const { token, password } = readRequest(resetPasswordSchema, req.body);
    await limits.take('tokenByAddress', addressOf(req));
    await accounts.resetPassword(token, password);
    res.status(204).end();
  });
  return router;
}

async function takeMail(limits: Limits, req: Request, email: string): Promise<void> {
  await limits.take('mailByAddress', addressOf(req));
  await limits.take('mailByEmail', email);
}

function mailSent(localMailUrl: string | null): MailSent {
  return { message: 'An e-mail is on its way: open the link in it.', localMailUrl };
}
