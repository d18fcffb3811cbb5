import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { DecodedText } from './decoded-text';

function decode(pieces: readonly Uint8Array[]): { text: string; encoding: string } {
  const decoded = new DecodedText(pieces[0] ?? new Uint8Array());
  const text = pieces.map((piece) => decoded.push(piece)).join('') + decoded.finish();
  return { text, encoding: decoded.encoding };
}

describe('bytes to text', () => {
  it('reads UTF-8 as it was written, wherever it is cut', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 40 }), fc.nat(), (written, cut) => {
        const text = written.replaceAll('\uFEFF', '');
        const bytes = new TextEncoder().encode(`ab${text}`);
        const at = 2 + (cut % (bytes.length - 1));
        expect(decode([bytes.subarray(0, at), bytes.subarray(at)])).toEqual({
          text: `ab${text}`,
          encoding: 'utf-8',
        });
      }),
      { numRuns: 1000, seed: 5 },
    );
  });

  it('gives the same text however any bytes are cut', () => {
    const anyBytes = fc.uint8Array({ minLength: 2, maxLength: 30 });
    fc.assert(
      fc.property(anyBytes, fc.nat(), (tail, cut) => {
        const bytes = Uint8Array.from([97, 98, ...tail]);
        const at = 2 + (cut % (bytes.length - 1));
        expect(decode([bytes.subarray(0, at), bytes.subarray(at)])).toEqual(decode([bytes]));
      }),
      { numRuns: 2000, seed: 6 },
    );
  });

  it('reads Windows-1252 from the first byte on that is not UTF-8', () => {
    // Code page 1252 as the Unicode Consortium lists it (CP1252.TXT, 1998): 0x80 €, 0x93 and 0x94 quotes, 0xB0 °.
    const bytes = Uint8Array.from([0xc3, 0xa9, 0x20, 0x80, 0x93, 0x94, 0xb0]);
    expect(decode([bytes])).toEqual({ text: 'é €“”°', encoding: 'windows-1252' });
  });

  it('reads a character that is cut off at the end as Windows-1252', () => {
    expect(decode([Uint8Array.from([97, 0xc3])])).toEqual({ text: 'aÃ', encoding: 'windows-1252' });
  });

  it('drops byte order marks', () => {
    expect(decode([Uint8Array.from([0xef, 0xbb, 0xbf, 97])])).toEqual({
      text: 'a',
      encoding: 'utf-8',
    });
    expect(decode([Uint8Array.from([0xff, 0xfe, 97, 0])])).toEqual({
      text: 'a',
      encoding: 'utf-16le',
    });
    expect(decode([Uint8Array.from([0xfe, 0xff, 0, 97])])).toEqual({
      text: 'a',
      encoding: 'utf-16be',
    });
  });
});
