/** The rows of a simple table (no quotes in it) written anew: header and cells, by the columns' places. */
export function rewriteTable(
  text: string,
  delimiter: string,
  header: readonly string[],
  rewrite: (cells: readonly string[], row: number) => readonly string[],
): string {
  const [, ...rows] = text.trimEnd().split('\n');
  const lines = rows.map((row, at) => rewrite(row.split(delimiter), at).join(delimiter));
  return [header.join(delimiter), ...lines].join('\n') + '\n';
}

/** Lines put before lines of a text: by 1-based number of the finished file, ascending. */
export function withLines(text: string, lines: readonly (readonly [number, string])[]): string {
  const all = text.trimEnd().split('\n');
  for (const [line, content] of lines) all.splice(line - 1, 0, content);
  return all.join('\n') + '\n';
}
