import { DATE_ORDERS, type DateOrder } from './column-map';

const YEAR_LAST = /^(\d{1,2})([-/.])(\d{1,2})\2\d{4}(?!\d)/;

/** How dates whose year stands last are read. */
export interface DateReading {
  /** null: there are no such dates, or their order is not known. */
  readonly order: DateOrder | null;
  /** A date that can be read both ways, and with it the file: the map has to say which is right. */
  readonly openExample: string | null;
}

/** The order of day and month, from the map's word or from dates of which only one reading is possible. */
export function findDateOrder(cells: readonly string[], told: DateOrder | undefined): DateReading {
  if (told !== undefined) return { order: told, openExample: null };
  let example: string | null = null;
  const possible = new Set<DateOrder>(DATE_ORDERS);
  for (const cell of cells) {
    const [date, first, , second] = YEAR_LAST.exec(cell.trim()) ?? [];
    if (date === undefined) continue;
    example ??= date;
    if (Number(first) > 12) possible.delete('month-day-year');
    if (Number(second) > 12) possible.delete('day-month-year');
  }
  if (example === null) return { order: null, openExample: null };
  const [order, other] = possible;
  return other === undefined
    ? { order: order ?? null, openExample: null }
    : { order: null, openExample: example };
}
