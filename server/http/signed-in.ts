import type { Request } from 'express';
import { forbidden, unauthenticated } from './app-error';

/** The account of a request, read anew from the database with its session. */
export interface SignedInAccount {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly kind: 'member' | 'steward';
  readonly createdAt: Date;
}

export function signedInAccount(req: Request): SignedInAccount | null {
  return (req.user as SignedInAccount | undefined) ?? null; // passport leaves its type open
}

/** The account that asks, or 401. */
export function requireAccount(req: Request): SignedInAccount {
  const account = signedInAccount(req);
  if (!account) throw unauthenticated();
  return account;
}

/** The steward that asks, or 401, or 403. */
export function requireSteward(req: Request): SignedInAccount {
  const account = requireAccount(req);
  if (account.kind !== 'steward') throw forbidden('This is for the steward of the installation.');
  return account;
}
