import { accountPaths, type Session, signInSchema } from '@stillpier/contract';
import { type Request, type RequestHandler, type Response, Router } from 'express';
import { Strategy as LocalStrategy } from 'passport-local';
import { AppError } from '../http/app-error';
import { addressOf, type Limits } from '../http/limits';
import { readRequest } from '../http/read-request';
import { type Authenticator, SESSION_COOKIE } from '../http/session';
import { type SignedInAccount, signedInAccount } from '../http/signed-in';
import { type AccountService, toAccount } from './account-service';

const STAY_MS = 30 * 24 * 3_600_000;

export interface SessionParts {
  readonly accounts: AccountService;
  readonly authenticator: Authenticator;
  readonly limits: Limits;
}

export function sessionRoutes({ accounts, authenticator, limits }: SessionParts): Router {
  const router = Router();
  authenticator.use(passwordStrategy(accounts));

  router.get(accountPaths.session, (req, res) => {
    res.json(toSession(signedInAccount(req)));
  });
  router.post(accountPaths.session, async (req, res) => {
    const { email, stay } = readRequest(signInSchema, req.body);
    await limits.take('signInByAddress', addressOf(req));
    await limits.take('signInByEmail', email);
    const account = await authenticate(authenticator, req, res);
    await limits.forget('signInByEmail', email);
    await logIn(req, account);
    if (stay) req.session.cookie.maxAge = STAY_MS;
    res.json(toSession(account));
  });
  router.delete(accountPaths.session, async (req, res) => {
    await endSession(req);
    res.clearCookie(SESSION_COOKIE).status(204).end();
  });
  return router;
}

function toSession(account: SignedInAccount | null): Session {
  return { account: account && toAccount(account) };
}

function passwordStrategy(accounts: AccountService): LocalStrategy {
  return new LocalStrategy({ usernameField: 'email' }, (email, password, done) => {
    accounts.checkPassword(email.toLowerCase(), password).then((account) => {
      done(null, account ?? false);
    }, done);
  });
}

/** passport speaks in callbacks: this one resolves with the account, or throws 401. */
function authenticate(
  authenticator: Authenticator,
  req: Request,
  res: Response,
): Promise<SignedInAccount> {
  return new Promise((resolve, reject) => {
    const take = (error: unknown, account: SignedInAccount | false): void => {
      if (account) resolve(account);
      else reject(error instanceof Error ? error : wrongCredentials());
    };
    const handler = authenticator.authenticate('local', take) as RequestHandler;
    handler(req, res, reject);
  });
}

function wrongCredentials(): AppError {
  const detail = 'The e-mail address and the password do not belong together.';
  return new AppError(401, 'wrong-credentials', detail);
}

/** Starts a session with a new id: whoever knew the id of before has nothing of it. */
function logIn(req: Request, account: SignedInAccount): Promise<void> {
  return new Promise((resolve, reject) => {
    req.logIn(account, (error: unknown) => {
      if (error instanceof Error) reject(error);
      else resolve();
    });
  });
}

function endSession(req: Request): Promise<void> {
  return new Promise((resolve, reject) => {
    req.session.destroy((error: unknown) => {
      if (error instanceof Error) reject(error);
      else resolve();
    });
  });
}
