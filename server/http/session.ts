import type { Request, RequestHandler } from 'express';
import session from 'express-session';
import passport from 'passport';
import type { SessionStore } from './session-store';
import type { SignedInAccount } from './signed-in';

export const SESSION_COOKIE = 'stillpier-session';

/** Session and signed-in account of each request. */
export function sessionHandlers(store: SessionStore, secret: string): RequestHandler[] {
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
    passport.initialize(),
    passportFor(store).session(),
  ];
}

function passportFor(store: SessionStore): passport.Authenticator {
  const authenticator = new passport.Passport();
  authenticator.serializeUser<string>((account, done) => {
    done(null, (account as SignedInAccount).id);
  });
  authenticator.deserializeUser<string, Request>((req, _id, done) => {
    done(null, store.accountOf(req) ?? false);
  });
  return authenticator;
}
