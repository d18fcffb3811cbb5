import type { Request } from 'express';
import { unauthenticated } from './app-error';

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
