/** Physical lines of a file of single bytes or UTF-8, counted byte by byte; an empty last one is none. */
export function physicalLines(bytes: Uint8Array): number {
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
