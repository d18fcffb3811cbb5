/** Rows as CSV (RFC 4180). */
export function csvText(rows: readonly (readonly (string | number | null)[])[]): string {
  return rows.map((cells) => `${cells.map(csvCell).join(',')}\r\n`).join('');
}

/** A leading sign that a spreadsheet takes for a formula is told apart by an apostrophe. */
function csvCell(value: string | number | null): string {
  if (value === null) return '';
  if (typeof value === 'number') return String(value);
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  return /[",\r\n]/.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}
