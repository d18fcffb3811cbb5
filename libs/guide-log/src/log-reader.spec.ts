import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { HEADER, utf8 } from '../../../test/support/small-guide-log';
import { type GuideLog } from './guide-log';
import { GuideLogError } from './guide-log-error';
import { createLogReader, readGuideLog } from './log-reader';

/** A log with comments, quotes and states; 2,500 frames are longer than the 64 KiB that the dialect is found from. */
function logOf(frames: number, lineEnd = '\n'): string {
  const lines = ['# night', `${HEADER},state,target`];
  for (let n = 0; n < frames; n++) {
    if (n % 500 === 7) lines.push('# cloud, "thin"', '');
    lines.push(`${n * 2},${(n % 7) / 10},-${(n % 5) / 10},guiding,"Field ""${n % 3}"""`);
  }
  return lines.join(lineEnd) + lineEnd;
}

/** Physical lines, counted byte by byte. */
function physicalLines(bytes: Uint8Array): number {
  let lines = 0;
  let isOpen = false;
  for (let at = 0; at < bytes.length; at++) {
    const isEnd = bytes[at] === 10 || bytes[at] === 13;
    if (bytes[at] === 13 && bytes[at + 1] === 10) at++;
    if (isEnd) lines++;
    isOpen = !isEnd;
  }
  return isOpen ? lines + 1 : lines;
}

function readOrSay(chunks: Iterable<Uint8Array>): GuideLog | string {
  try {
    return readGuideLog(chunks);
  } catch (error) {
    if (error instanceof GuideLogError) return error.message;
    throw error;
  }
}

function cutAt(bytes: Uint8Array, cuts: readonly number[]): Uint8Array[] {
  const places = cuts.map((cut) => cut % (bytes.length + 1)).sort((a, b) => a - b);
  return [...places, bytes.length].map((end, i) => bytes.subarray(places[i - 1] ?? 0, end));
}

const spoiling = fc.array(
  fc.record({
    at: fc.nat(),
    remove: fc.oneof(fc.constant(0), fc.nat({ max: 3 }), fc.nat({ max: 400 })),
    insert: fc.oneof(
      fc.constantFrom(
        '"',
        ',',
        '\n',
        '\r',
        '\r\n',
        '""',
        '#',
        ';',
        '\0',
        'é',
        '\uFEFF',
        ' ',
        'nan',
        '-',
      ),
      fc.string({ maxLength: 6 }),
    ),
    rawByte: fc.option(fc.integer({ min: 0x80, max: 0xff })),
  }),
  { minLength: 1, maxLength: 12 },
);

/** The log with bytes taken out and put in; its first bytes stay, so that no byte order mark arises there. */
function spoil(
  bytes: Uint8Array,
  faults: typeof spoiling extends fc.Arbitrary<infer T> ? T : never,
) {
  return faults.reduce((log, { at, remove, insert, rawByte }) => {
    const place = 8 + (at % (log.length - 8));
    const put = [...utf8(insert), ...(rawByte === null ? [] : [rawByte])];
    const rest = log.subarray(place + remove);
    const spoiled = new Uint8Array(place + put.length + rest.length);
    spoiled.set(log.subarray(0, place));
    spoiled.set(put, place);
    spoiled.set(rest, place + put.length);
    return spoiled;
  }, bytes);
}

const short = fc.constantFrom('\n', '\r\n', '\r').map((lineEnd) => utf8(logOf(40, lineEnd)));
const long = fc.constant(utf8(logOf(2500)));

describe('the reader of guide logs', () => {
  it('counts every physical line once, whatever was done to the file', () => {
    let readable = 0;
    fc.assert(
      fc.property(short, spoiling, (bytes, faults) => {
        const spoiled = spoil(bytes, faults);
        const log = readOrSay([spoiled]);
        if (typeof log === 'string') return;
        readable++;
        const { lines, header, comment, frames, refused, blank } = log.lineCounts;
        expect(header + comment + frames + refused + blank).toBe(lines);
        expect(lines).toBe(physicalLines(spoiled));
        expect(log.frames.count).toBe(frames);
        expect(log.reading).toMatchObject({ lines, frames, refusedCount: refused });
      }),
      { numRuns: 1000, seed: 20260314 },
    );
    expect(readable).toBeGreaterThan(600);
  });

  it('names the physical line of each refusal', () => {
    fc.assert(
      fc.property(short, fc.nat({ max: 39 }), (bytes, which) => {
        const text = new TextDecoder().decode(bytes);
        const lines = text.split(/\r\n|\n|\r/);
        const frames = lines.flatMap((line, at) => (/^\d/.test(line) ? [at] : []));
        const spoiled = text.replace(`\n${which * 2},`, `\n${which * 2},x,`);
        fc.pre(spoiled !== text);
        expect(readGuideLog(utf8(spoiled)).reading.refused).toEqual([
          { line: frames[which]! + 1, reason: 'the line has 6 columns instead of 5' },
        ]);
      }),
      { numRuns: 60, seed: 1 },
    );
  });

  it('reads the same however a short file is cut into chunks', () => {
    fc.assert(
      fc.property(short, spoiling, fc.array(fc.nat(), { maxLength: 30 }), (bytes, faults, cuts) => {
        const spoiled = spoil(bytes, faults);
        expect(readOrSay(cutAt(spoiled, cuts))).toEqual(readOrSay([spoiled]));
      }),
      { numRuns: 500, seed: 20260315 },
    );
  });

  it('reads the same however a long file is cut into chunks', () => {
    fc.assert(
      fc.property(long, spoiling, fc.array(fc.nat(), { maxLength: 30 }), (bytes, faults, cuts) => {
        const spoiled = spoil(bytes, faults);
        expect(readOrSay(cutAt(spoiled, cuts))).toEqual(readOrSay([spoiled]));
      }),
      { numRuns: 40, seed: 20260316 },
    );
  });

  it('reads a file byte by byte', () => {
    const bytes = utf8(logOf(2500, '\r\n'));
    expect(readGuideLog(cutAt(bytes, [...bytes.keys()]))).toEqual(readGuideLog(bytes));
  });

  it('lists the first 200 refused lines and counts all', () => {
    const bad = Array.from({ length: 300 }, (_, n) => `${n},x,1`).join('\n');
    const { reading } = readGuideLog(utf8(`${HEADER}\n0,1,1\n${bad}\n`));
    expect(reading.refusedCount).toBe(300);
    expect(reading.refused).toHaveLength(200);
    expect(reading.refused.at(-1)).toMatchObject({ line: 202 });
  });

  it('gives every column the same length and keeps gaps as NaN', () => {
    const reader = createLogReader({});
    reader.push(utf8(`${HEADER},snr,pier side,declination\n0,1,2,30,east,10\n1,,,,W,\n`));
    const { frames } = reader.finish();
    expect(frames.snr).toEqual(Float64Array.of(30, NaN));
    expect(frames.pierSide).toEqual(Uint8Array.of(1, 2));
    expect(frames.declinationDegrees).toEqual(Float64Array.of(10, NaN));
    expect(frames.raCorrection).toBeNull();
  });

  it("takes the target's place from the map where the log has none", () => {
    const map = { targetDeclinationDegrees: 20, targetHourAngleHours: 11.5 };
    const { frames } = readGuideLog(utf8(`${HEADER}\n0,1,2\n3600,1,2\n`), { map });
    expect([...(frames.declinationDegrees ?? [])]).toEqual([20, 20]);
    // One hour later 1.0027379 sidereal hours have passed: 12.5027379 h is -11.4972621 h.
    expect(frames.hourAngleHours?.[1]).toBeCloseTo(-11.4972621, 7);
  });
});
