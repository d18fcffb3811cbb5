/** Makes every line end (LF, CRLF, CR) a LF, piece by piece. */
export class LineEnds {
  /** A CR at the end of a piece waits: a LF may follow in the next one. */
  #heldCr = false;

  push(piece: string): string {
    if (piece === '') return '';
    let text = this.#heldCr ? '\r' + piece : piece;
    this.#heldCr = text.endsWith('\r');
    if (this.#heldCr) text = text.slice(0, -1);
    return text.includes('\r') ? text.replace(/\r\n?/g, '\n') : text;
  }

  finish(): string {
    return this.#heldCr ? '\n' : '';
  }
}
