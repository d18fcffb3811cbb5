import type { Request, RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import type { SessionStore } from './session-store';
import type { SignedInAccount } from './signed-in';

export const SESSION_COOKIE = 'stillpier-session';

type Done = (error: unknown, account?: SignedInAccount | false) => void;

export type Authenticator = InstanceType<typeof passport.Passport>;

/** Session and signed-in account of each request. */
export function sessionHandlers(
  store: SessionStore,
  authenticator: Authenticator,
  secret: string,
): RequestHandler[] {
  return [
    session({
      store,
      name: SESSION_COOKIE,
      secret,
      resave: false,
      saveUninitialized: false,
      // 'auto': Secure where the request came by https, as it does in production
      cookie: { httpOnly: true, sameSite: 'lax', secure: 'auto', path: '/' },
    }),
    authenticator.initialize() as RequestHandler,
    authenticator.session() as RequestHandler,
  ];
}

/** Passport on these sessions: the session names the account, the store has read it with it. */
export function makeAuthenticator(store: SessionStore): Authenticator {
  const authenticator = new passport.Passport();
  authenticator.serializeUser<string>((account, done) => {
    done(null, (account as SignedInAccount).id);
  });
  authenticator.deserializeUser((req: Request, _id: string, done: Done) => {
    done(null, store.accountOf(req) ?? false);
  });
  return authenticator;
}
