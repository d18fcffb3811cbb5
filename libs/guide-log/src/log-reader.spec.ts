import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { physicalLines } from '../../../test/support/physical-lines';
import { HEADER, utf8 } from '../../../test/support/small-guide-log';
import { faults as spoiling, spoil } from '../../../test/support/spoil';
import { type GuideLog } from './guide-log';
import { GuideLogError } from './guide-log-error';
import { createLogReader, MOST_LINES, readGuideLog } from './log-reader';

/** A log with comments, quotes and states; 2,500 frames are longer than the 64 KiB that the dialect is found from. */
function logOf(frames: number, lineEnd = '\n'): string {
  const lines = ['# night', `${HEADER},state,target`];
  for (let n = 0; n < frames; n++) {
    if (n % 500 === 7) lines.push('# cloud, "thin"', '');
    lines.push(`${n * 2},${(n % 7) / 10},-${(n % 5) / 10},guiding,"Field ""${n % 3}"""`);
  }
  return lines.join(lineEnd) + lineEnd;
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

  it('refuses a file of more lines than it may have, as soon as they are seen', () => {
    const lines = `${HEADER}\n0,1,2\n1,1,2\n`;
    expect(readGuideLog(utf8(lines), { mostLines: 3 }).reading.lines).toBe(3);
    const sentence =
      'The file has more than 1,234 lines, the most that are read of one file: cut it into several.';
    const reader = createLogReader({ mostLines: 1234 });
    const long = utf8(logOf(9000));
    expect(() => {
      reader.push(long);
    }).toThrow(expect.objectContaining({ fault: 'too-many-lines', message: sentence }));
    expect(MOST_LINES).toBe(2_000_000); // the limit that the project has set itself
  });

  it('keeps a log whose file ends in zeros or other bytes that are no text', () => {
    const { reading } = readGuideLog(utf8(`${logOf(40)}${'\0'.repeat(5000)}`));
    expect(reading.frames).toBe(40);
    expect(reading.refused).toEqual([{ line: 45, reason: 'the line has 1 column instead of 5' }]);
    const cut = readGuideLog(utf8(`${logOf(40)}80,0.1,-0.\n\x1A`));
    expect(cut.reading).toMatchObject({ frames: 40, refusedCount: 2 });
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
