import { type ColumnRole } from './column-map';
import { type ColumnPlan, ROLE_NAMES } from './column-plan';
import { GrowingNumbers } from './growing-arrays';
import { isMissingCell, readNumber } from './number-cell';

const NUMBER_ROLES = [
  'raError',
  'decError',
  'raCorrection',
  'decCorrection',
  'snr',
  'brightness',
  'declination',
  'hourAngle',
] as const satisfies ColumnRole[];
export type NumberRole = (typeof NUMBER_ROLES)[number];

interface NumberColumn {
  readonly role: NumberRole;
  readonly index: number;
  readonly values: GrowingNumbers;
}

/** The columns of plain numbers: a row is read whole first and appended only when the line is not refused. */
export class NumberColumns {
  readonly #columns: readonly NumberColumn[];
  /** The row that was read last. */
  readonly #row: Float64Array;

  constructor(
    plan: ColumnPlan,
    private readonly decimalCode: number,
  ) {
    this.#columns = NUMBER_ROLES.flatMap((role): NumberColumn[] => {
      const planned = plan.columns.find((column) => column.role === role);
      return planned ? [{ role, index: planned.index, values: new GrowingNumbers() }] : [];
    });
    this.#row = new Float64Array(this.#columns.length);
  }

  /** Reads a row; the name and text of a cell that is no number, or null when all is well. */
  read(cells: readonly string[]): string | null {
    for (let at = 0; at < this.#columns.length; at++) {
      const column = this.#columns[at];
      if (!column) continue;
      const cell = cells[column.index] ?? '';
      const number = readNumber(cell, this.decimalCode);
      if (Number.isNaN(number) && !isMissingCell(cell)) {
        return `${ROLE_NAMES[column.role]} is not a number: ${quoted(cell)}`;
      }
      this.#row[at] = number;
    }
    return null;
  }

  /** The row's number of a role; NaN where it is missing. */
  value(role: NumberRole): number {
    return this.#row[this.#at(role)] ?? NaN;
  }

  setValue(role: NumberRole, number: number): void {
    this.#row[this.#at(role)] = number;
  }

  append(): void {
    for (let at = 0; at < this.#columns.length; at++) {
      this.#columns[at]?.values.append(this.#row[at] ?? NaN);
    }
  }

  /** The values of a role, or null when the log has no such column. */
  finish(role: NumberRole): Float64Array | null {
    return this.#columns[this.#at(role)]?.values.finish() ?? null;
  }

  #at(role: NumberRole): number {
    return this.#columns.findIndex((column) => column.role === role);
  }
}

/** A cell as it stands in a reason, not longer than a line can show. */
export function quoted(cell: string): string {
  return JSON.stringify(cell.length > 40 ? `${cell.slice(0, 40)}…` : cell);
}
