import * as fc from 'fast-check';
import { utf8 } from './small-guide-log';

export interface Fault {
  readonly at: number;
  readonly remove: number;
  readonly insert: string;
  /** A byte that is hardly ever UTF-8 where it is put. */
  readonly rawByte: number | null;
}

const SIGNS =
  '" , \n \r \r\n "" # ; | \t \0 é \uFEFF nan - − +1e9 1,5 "\n \n\n time_s ra_error_px,dec_error_px 31.12.2026 ÿ'
    .split(' ')
    .concat(' ');

/** What may happen to a file: bytes lost, up to a whole line of them, and other bytes put in. */
export const faults: fc.Arbitrary<Fault[]> = fc.array(
  fc.record({
    at: fc.nat(),
    remove: fc.oneof(fc.constant(0), fc.nat({ max: 3 }), fc.nat({ max: 400 })),
    insert: fc.oneof(fc.constantFrom(...SIGNS), fc.string({ maxLength: 6 })),
    rawByte: fc.option(fc.integer({ min: 0x80, max: 0xff })),
  }),
  { minLength: 1, maxLength: 5 },
);

/** The file with its faults; its first bytes stay, so that no byte order mark arises there. */
export function spoil(bytes: Uint8Array, spoiling: readonly Fault[]): Uint8Array {
  return spoiling.reduce((log, { at, remove, insert, rawByte }) => {
    const place = 8 + (at % Math.max(1, log.length - 8));
    const put = [...utf8(insert), ...(rawByte === null ? [] : [rawByte])];
    const rest = log.subarray(place + remove);
    const spoiled = new Uint8Array(place + put.length + rest.length);
    spoiled.set(log.subarray(0, place));
    spoiled.set(put, place);
    spoiled.set(rest, place + put.length);
    return spoiled;
  }, bytes);
}
