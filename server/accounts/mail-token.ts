import { createHash, randomBytes } from 'node:crypto';

const TOKEN_BYTES = 32;

export const CONFIRM_HOURS = 72;
export const RESET_HOURS = 1;

export interface MailToken {
  /** For the link in the e-mail, and nowhere else. */
  readonly token: string;
  /** For the database: who reads it there cannot use it. */
  readonly sha256: Buffer;
  readonly expiresAt: Date;
}

export function makeMailToken(validHours: number): MailToken {
  const token = randomBytes(TOKEN_BYTES).toString('base64url');
  return { token, sha256: sha256Of(token), expiresAt: hoursFromNow(validHours) };
}

export function sha256Of(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}

export function hoursFromNow(hours: number): Date {
  return new Date(Date.now() + hours * 3_600_000);
}
