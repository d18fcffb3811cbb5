/** Middle of the first line of a note, from its top. */
const FIRST_LINE_PX = 11;
const BETWEEN_NOTES_PX = 26;

export interface NoteBox {
  /** Middle of its key, from the top of the margin; null where it has none. */
  readonly keyPx: number | null;
  readonly heightPx: number;
}

/**
 * The room above each note of a margin, in pixels, so that its first line stands at the height of its key; a note that
 * the one above would reach into follows it.
 */
export function besideKeys(notes: readonly NoteBox[]): number[] {
  let freePx = 0;
  return notes.map(({ keyPx, heightPx }) => {
    const roomPx = keyPx === null ? 0 : Math.max(0, Math.round(keyPx - FIRST_LINE_PX - freePx));
    freePx += roomPx + heightPx + BETWEEN_NOTES_PX;
    return roomPx;
  });
}
