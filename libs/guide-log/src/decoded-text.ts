export type Encoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252';

const BYTE_ORDER_MARK = '\uFEFF';

/** Windows-1252 above ASCII controls: code points of the bytes 0x80 to 0x9f (the five unused ones stay as they are). */
const WINDOWS_1252_80_TO_9F = [
  0x20ac, 0x81, 0x201a, 0x192, 0x201e, 0x2026, 0x2020, 0x2021, 0x2c6, 0x2030, 0x160, 0x2039, 0x152,
  0x8d, 0x17d, 0x8f, 0x90, 0x2018, 0x2019, 0x201c, 0x201d, 0x2022, 0x2013, 0x2014, 0x2dc, 0x2122,
  0x161, 0x203a, 0x153, 0x9d, 0x17e, 0x178,
];

/**
 * Bytes to text, piece by piece: UTF-16 by its byte order mark, else UTF-8, and Windows-1252 from the first byte on
 * that cannot be UTF-8. Byte order marks are dropped, also inside (files that were joined have them there). The text
 * depends on the bytes alone, not on where they were cut into pieces.
 */
export class DecodedText {
  #encoding: Encoding;
  /** The first bytes of a UTF-8 character whose rest is in the next piece. */
  #held = new Uint8Array(0);
  readonly #utf16: InstanceType<typeof TextDecoder> | null;
  readonly #utf8 = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });

  /** @param head The first bytes of the file, two at least where it has them; they are not consumed. */
  constructor(head: Uint8Array) {
    const [first, second] = head;
    this.#encoding = 'utf-8';
    if (first === 0xff && second === 0xfe) this.#encoding = 'utf-16le';
    if (first === 0xfe && second === 0xff) this.#encoding = 'utf-16be';
    this.#utf16 = this.#encoding === 'utf-8' ? null : new TextDecoder(this.#encoding);
  }

  get encoding(): Encoding {
    return this.#encoding;
  }

  push(piece: Uint8Array): string {
    const text = this.#decode(piece);
    return text.includes(BYTE_ORDER_MARK) ? text.replaceAll(BYTE_ORDER_MARK, '') : text;
  }

  finish(): string {
    if (this.#utf16) return this.#utf16.decode();
    return this.#held.length === 0 ? '' : this.#decodeUtf8(this.#held, this.#held.length);
  }

  #decode(piece: Uint8Array): string {
    if (this.#utf16) return this.#utf16.decode(piece, { stream: true });
    if (this.#encoding === 'windows-1252') return decodeWindows1252(piece);
    const bytes = joinBytes(this.#held, piece);
    const complete = completeUtf8Length(bytes);
    this.#held = bytes.slice(complete);
    return this.#decodeUtf8(bytes, complete);
  }

  #decodeUtf8(bytes: Uint8Array, length: number): string {
    try {
      return this.#utf8.decode(bytes.subarray(0, length));
    } catch {
      // A fatal decoder throws TypeError at bytes that are not UTF-8, and there is no way to ask beforehand.
      this.#encoding = 'windows-1252';
      this.#held = new Uint8Array(0);
      const sound = soundUtf8Length(bytes);
      return this.#utf8.decode(bytes.subarray(0, sound)) + decodeWindows1252(bytes.subarray(sound));
    }
  }
}

function joinBytes(a: Uint8Array, b: Uint8Array): Uint8Array {
  if (a.length === 0) return b;
  const joined = new Uint8Array(a.length + b.length);
  joined.set(a);
  joined.set(b, a.length);
  return joined;
}

/** Length without a last character that is cut off. */
function completeUtf8Length(bytes: Uint8Array): number {
  for (let back = 1; back <= Math.min(3, bytes.length); back++) {
    const byte = bytes[bytes.length - back] ?? 0;
    if (byte < 0x80) break;
    if (byte < 0xc0) continue; // a continuation byte: its lead stands further left
    const needed = byte >= 0xf0 ? 4 : byte >= 0xe0 ? 3 : 2;
    return needed > back ? bytes.length - back : bytes.length;
  }
  return bytes.length;
}

/** Number of bytes before the first sequence that is not UTF-8. */
function soundUtf8Length(bytes: Uint8Array): number {
  const probe = new TextDecoder('utf-8', { fatal: true, ignoreBOM: true });
  let sound = 0;
  try {
    for (let i = 0; i < bytes.length; i++) {
      if (probe.decode(bytes.subarray(i, i + 1), { stream: true }) !== '') sound = i + 1;
    }
  } catch {
    // Thrown at the very byte that is looked for.
  }
  return sound;
}

/** Not by TextDecoder: Node 20 reads the bytes 0x80 to 0x9f as control characters, browsers as this table. */
function decodeWindows1252(bytes: Uint8Array): string {
  let text = '';
  for (let from = 0; from < bytes.length; from += 4096) {
    const codes = Array.from(bytes.subarray(from, from + 4096), (byte) =>
      byte >= 0x80 && byte < 0xa0 ? (WINDOWS_1252_80_TO_9F[byte - 0x80] ?? byte) : byte,
    );
    text += String.fromCharCode(...codes);
  }
  return text;
}
