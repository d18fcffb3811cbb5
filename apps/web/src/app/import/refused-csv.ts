import type { Reading } from '@stillpier/contract';
import { csvText } from '../page/csv-text';

/** The lines that were left out, as a table for a spreadsheet. */
export function refusedCsv(refused: Reading['refused']): string {
  return csvText([['line', 'reason'], ...refused.map(({ line, reason }) => [line, reason])]);
}
