import { type ColumnMap, GuideLogError, previewGuideLog, readGuideLog } from '@stillpier/guide-log';
import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { physicalLines } from '../support/physical-lines';
import { sampleLogs } from '../support/sample-logs';
import { utf8 } from '../support/small-guide-log';
import { faults, spoil } from '../support/spoil';

/**
 * Reads a file and checks the law of the reader: every line is a header, a comment, a frame, refused or blank, and
 * every frame has a time. A file that cannot be read says so by a sentence, never by another error.
 *
 * @returns Whether it could be read.
 */
function readLawfully(bytes: Uint8Array, map: ColumnMap): boolean {
  try {
    const { frames, reading, lineCounts } = readGuideLog(bytes, { map });
    const { lines, header, comment, refused, blank } = lineCounts;
    const sum = header + comment + lineCounts.frames + refused + blank;
    const physical = linesInBytes(bytes, reading.encoding) ?? lines;
    const stray = frames.timeSeconds.findIndex((time) => !Number.isFinite(time));
    // One assertion for all: thousands of inputs a second would be half a second of assertions.
    expect([sum, physical, frames.count, reading.refusedCount, stray]).toEqual([
      lines,
      lines,
      lineCounts.frames,
      refused,
      -1,
    ]);
    return true;
  } catch (error) {
    if (!(error instanceof GuideLogError)) throw error;
    expect(error.message).toMatch(/^[A-Z].*\.$/s);
    return false;
  }
}

/** Byte order marks are no text: the lines of a file are those that it has without them. */
function withoutMarks(bytes: Uint8Array): Uint8Array {
  const kept: number[] = [];
  for (let at = 0; at < bytes.length; at++) {
    if (bytes[at] === 0xef && bytes[at + 1] === 0xbb && bytes[at + 2] === 0xbf) at += 2;
    else kept.push(bytes[at] ?? 0);
  }
  return Uint8Array.from(kept);
}

/** Lines as the bytes have them; null where no byte tells them, in UTF-16 and where letters look like a mark. */
function linesInBytes(bytes: Uint8Array, encoding: string): number | null {
  const text = withoutMarks(bytes);
  if (encoding === 'utf-8') return physicalLines(text);
  return encoding === 'windows-1252' && text.length === bytes.length ? physicalLines(bytes) : null;
}

const DELIMITERS = [',', ';', '\t', '|', '  '];
const NUMBERED: ColumnMap = {
  columns: {
    '1': { role: 'time', unit: 'clock' },
    '2': { role: 'xError', unit: 'guide px', sentinels: ['-1', '--'] },
    '3': { role: 'yError', unit: 'guide px' },
    '4': { role: 'raCorrection', unit: 'ms' },
    '5': { role: 'raDirection' },
  },
  cameraAngleDegrees: 33,
};
const HEADERS = [
  ['time s', 'ra error arcsec', 'dec error arcsec', 'snr', 'state'],
  ['timestamp', 'RA error (px)', 'Dec error (px)', 'ra correction ms', 'target'],
];

interface Writing {
  readonly delimiter: string;
  readonly lineEnd: string;
  readonly header: readonly string[] | null;
  readonly decimal: string;
  readonly frames: number;
  readonly preamble: string;
  readonly runs: number;
}

const writing: fc.Arbitrary<Writing> = fc.record({
  delimiter: fc.constantFrom(...DELIMITERS),
  lineEnd: fc.constantFrom('\n', '\r\n', '\r'),
  header: fc.constantFrom(...HEADERS, null),
  decimal: fc.constantFrom('.', ','),
  frames: fc.integer({ min: 1, max: 14 }),
  preamble: fc.constantFrom('', 'Pier: north', '# a night', 'one, two; three', '"open'),
  runs: fc.integer({ min: 1, max: 3 }),
});

/** A small log in a dialect; without a header it is one for the map NUMBERED. */
function written({ delimiter, lineEnd, header, decimal, frames, preamble, runs }: Writing): string {
  const lines = preamble === '' ? [] : [preamble];
  for (let run = 0; run < runs; run++) {
    const order = run === 2 ? [0, 2, 1, 3, 4] : [0, 1, 2, 3, 4];
    if (header) lines.push(order.map((at) => header[at]?.replaceAll(' ', '_')).join(delimiter));
    for (let n = 0; n < frames; n++) {
      const clock = `21:4${run}:${String(n * 2 + 10)}`;
      const time = header === null ? clock : `2026-03-14T${clock}Z`;
      const number = (value: number) => value.toFixed(2).replace('.', decimal);
      const cells = header?.[0] === 'time s' ? [number(n * 2)] : [time];
      cells.push(number(n / 7), number(-n / 9), String(n * 10), header ? 'guiding' : 'E');
      lines.push(cells.join(delimiter));
    }
  }
  return lines.join(lineEnd) + lineEnd;
}

describe('no line of a file is lost without a word', () => {
  it('in 5,000 small logs of every dialect with faults in them', () => {
    let readable = 0;
    fc.assert(
      fc.property(writing, faults, (dialect, spoiling) => {
        const bytes = spoil(utf8(written(dialect)), spoiling);
        if (readLawfully(bytes, dialect.header ? {} : NUMBERED)) readable++;
      }),
      { numRuns: 5000, seed: 20260401 },
    );
    // Most of them must come through, else the law would hold of nothing.
    expect(readable).toBeGreaterThan(2500);
  });

  it('in 3,000 files of any bytes and any signs, preview included', () => {
    const signs = fc.string({
      unit: fc.constantFrom(...Array.from('0123456789.,;|\t "\n\r#-:/TZaé\0\uFEFF')),
      maxLength: 300,
    });
    const bytes = fc.oneof(
      fc.uint8Array({ maxLength: 200 }),
      signs.map(utf8),
      signs.map((text) => utf8(`time s,ra error arcsec,dec error arcsec\n0,1,2\n${text}`)),
    );
    let readable = 0;
    fc.assert(
      fc.property(bytes, (file) => {
        const canBeRead = readLawfully(file, {});
        if (!canBeRead) return;
        readable++;
        expect(previewGuideLog(file).missing).toBeNull();
      }),
      { numRuns: 3000, seed: 20260402 },
    );
    expect(readable).toBeGreaterThan(500);
  });

  it('in 2,000 stretches of the sample logs with faults in them', () => {
    const samples = sampleLogs().map(({ bytes, map }) => {
      const lines = new TextDecoder().decode(bytes).split('\n');
      return { lines, map };
    });
    let readable = 0;
    fc.assert(
      fc.property(fc.constantFrom(...samples), fc.nat(), faults, ({ lines, map }, at, spoiling) => {
        const from = 6 + (at % (lines.length - 6));
        const stretch = [...lines.slice(0, 6), ...lines.slice(from, from + 14)].join('\n');
        if (readLawfully(spoil(utf8(stretch), spoiling), map)) readable++;
      }),
      { numRuns: 2000, seed: 20260403 },
    );
    expect(readable).toBeGreaterThan(1000);
  });
});
