import { importPaths, type TOKEN_MAILS, type TOKEN_SCOPES } from '@stillpier/contract';
import type { Request, RequestHandler } from 'express';
import { AppError, forbidden } from './app-error';
import { addressOf, type Limits } from './limits';
import type { SignedInAccount } from './signed-in';

/** What a program has signed in with, in place of a session. */
export interface BearerSignIn {
  readonly account: SignedInAccount;
  readonly tokenId: string;
  readonly scope: (typeof TOKEN_SCOPES)[number];
  readonly mails: (typeof TOKEN_MAILS)[number];
}

interface BearerParts {
  readonly signIn: (token: string) => Promise<BearerSignIn | null>;
  readonly limits: Limits;
}

const signIns = new WeakMap<Request, BearerSignIn>();

/** The token that a request came with; undefined for a browser's. */
export function bearerOf(req: Request): BearerSignIn | undefined {
  return signIns.get(req);
}

/**
 * Signs in who sends `Authorization: Bearer …`, before any body is read. Such a request has no session and needs no
 * check of its origin: no browser sends the header by itself. What the scope does not allow is refused here, for every
 * route at once.
 */
export function bearerTokens({ signIn, limits }: BearerParts): RequestHandler {
  return async (req, res, next) => {
    const token = /^Bearer (\S+)$/i.exec(req.get('authorization') ?? '')?.[1];
    if (token === undefined) {
      next();
      return;
    }
    const signedIn = await signIn(token);
    if (!signedIn) {
      await limits.take('wrongTokenByAddress', addressOf(req));
      throw wrongToken();
    }
    await limits.take('requestByToken', signedIn.tokenId);
    refuseBeyondScope(req, signedIn.scope);
    signIns.set(req, signedIn);
    req.user = signedIn.account;
    next();
  };
}

/** Lets a handler see only the requests of browsers. */
export function unlessBearer(handler: RequestHandler): RequestHandler {
  return (req, res, next) => {
    if (signIns.has(req)) next();
    else void handler(req, res, next);
  };
}

function wrongToken(): AppError {
  const detail = 'This token is not valid: it was revoked, has expired or never was.';
  return new AppError(401, 'wrong-token', detail, { headers: { 'WWW-Authenticate': 'Bearer' } });
}

const ID = '[0-9a-f-]{36}';
const UPLOADS = new RegExp(`^${importPaths.all(ID)}$`);
const UPLOADED = new RegExp(`^${importPaths.one(ID, ID)}$`);

function refuseBeyondScope({ method, baseUrl, path }: Request, scope: BearerSignIn['scope']): void {
  const address = `${baseUrl}${path}`;
  const isReading = method === 'GET' || method === 'HEAD';
  if (scope === 'read') {
    if (!isReading) throw forbidden('This token may read and change nothing.');
  } else if (!(method === 'POST' ? UPLOADS.test(address) : isReading && UPLOADED.test(address))) {
    throw forbidden('This token may send logs and ask what became of them, and nothing else.');
  }
}
