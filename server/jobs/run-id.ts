import { createHash } from 'node:crypto';

/** The same import and run give the same id however often they are read: links to a run outlive a second reading. */
export function runIdOf(importId: string, runIndex: number): string {
  const hash = createHash('sha256').update(`run ${runIndex} of ${importId}`).digest();
  hash[6] = ((hash[6] ?? 0) & 0x0f) | 0x80; // version 8 of RFC 9562: made by the application's own rule
  hash[8] = ((hash[8] ?? 0) & 0x3f) | 0x80;
  const hex = hash.toString('hex');
  return [
    hex.slice(0, 8),
    hex.slice(8, 12),
    hex.slice(12, 16),
    hex.slice(16, 20),
    hex.slice(20, 32),
  ].join('-');
}
