import { CameraAxes } from './camera-axes';
import { type ColumnMap, type ColumnRole } from './column-map';
import { type ColumnPlan, ROLE_NAMES } from './column-plan';
import { correctionWithSign } from './direction';
import { GrowingNumbers } from './growing-arrays';
import { isMissingCell, readNumber } from './number-cell';
import { hasCameraErrors } from './plan-check';
import { SentinelCells } from './sentinel-cells';

/** RA and Dec error stand first: the camera's axes are turned in the first two places of a row. */
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

const CAMERA_ROLES: Partial<Record<NumberRole, ColumnRole>> = {
  raError: 'xError',
  decError: 'yError',
};

interface NumberColumn {
  readonly role: NumberRole;
  /** What the file has it as; other than `role` for errors along the camera's axes. */
  readonly readAs: ColumnRole;
  index: number;
  readonly sentinels: SentinelCells | null;
  readonly values: GrowingNumbers;
}

interface DirectionColumn {
  readonly role: 'raDirection' | 'decDirection';
  index: number;
  /** Place of the correction that it gives a sign, in the row. */
  readonly correctionAt: number;
}

/** The columns of plain numbers: a row is read whole first and appended only when the line is not refused. */
export class NumberColumns {
  readonly #columns: readonly NumberColumn[];
  readonly #directions: readonly DirectionColumn[];
  /** The row that was read last. */
  readonly #row: Float64Array;
  /** null: the errors are along RA and Dec as they stand. */
  readonly #camera: CameraAxes | null;

  constructor(
    plan: ColumnPlan,
    map: ColumnMap,
    private readonly decimalCode: number,
  ) {
    this.#camera = hasCameraErrors(plan) ? new CameraAxes(map) : null;
    this.#columns = NUMBER_ROLES.flatMap((role): NumberColumn[] => {
      const readAs = this.#camera ? (CAMERA_ROLES[role] ?? role) : role;
      const planned = plan.columns.find((column) => column.role === readAs);
      if (!planned) return [];
      const sentinels =
        planned.sentinels.length > 0 ? new SentinelCells(planned.sentinels, decimalCode) : null;
      return [{ role, readAs, index: planned.index, sentinels, values: new GrowingNumbers() }];
    });
    this.#directions = (
      [
        ['raDirection', 'raCorrection'],
        ['decDirection', 'decCorrection'],
      ] as const
    ).flatMap(([role, corrected]): DirectionColumn[] => {
      const planned = plan.columns.find((column) => column.role === role);
      const correctionAt = this.#columns.findIndex((column) => column.role === corrected);
      return planned && correctionAt >= 0 ? [{ role, index: planned.index, correctionAt }] : [];
    });
    this.#row = new Float64Array(this.#columns.length);
  }

  /** Takes the columns at other places from here on: a header further down. */
  rearrange(plan: ColumnPlan): void {
    const indexOf = (role: ColumnRole) =>
      plan.columns.find((column) => column.role === role)?.index ?? -1;
    for (const column of this.#columns) column.index = indexOf(column.readAs);
    for (const direction of this.#directions) direction.index = indexOf(direction.role);
  }

  /** Reads a row, corrections with their signs. @returns Why it cannot be read, or null. */
  read(cells: readonly string[]): string | null {
    for (let at = 0; at < this.#columns.length; at++) {
      const column = this.#columns[at];
      if (!column) continue;
      const cell = cells[column.index] ?? '';
      const number = readNumber(cell, this.decimalCode);
      const isSentinel = column.sentinels?.has(cell, number) ?? false;
      if (Number.isNaN(number) && !isSentinel && !isMissingCell(cell)) {
        return `${ROLE_NAMES[column.readAs]} is not a number: ${quoted(cell)}`;
      }
      this.#row[at] = isSentinel ? NaN : number;
    }
    this.#camera?.turn(this.#row);
    return this.#directions.length === 0 ? null : this.#applyDirections(cells);
  }

  append(): void {
    for (let at = 0; at < this.#columns.length; at++) {
      this.#columns[at]?.values.append(this.#row[at] ?? NaN);
    }
  }

  /** The values of a role, or null when the log has no such column. */
  finish(role: NumberRole): Float64Array | null {
    return this.#columns.find((column) => column.role === role)?.values.finish() ?? null;
  }

  #applyDirections(cells: readonly string[]): string | null {
    for (const { role, index, correctionAt } of this.#directions) {
      const cell = cells[index] ?? '';
      const correction = correctionWithSign(this.#row[correctionAt] ?? NaN, cell);
      if (correction === null) return `${ROLE_NAMES[role]} is not known: ${quoted(cell)}`;
      this.#row[correctionAt] = correction;
    }
    return null;
  }
}

/** A cell as it stands in a reason, not longer than a line can show. */
export function quoted(cell: string): string {
  return JSON.stringify(cell.length > 40 ? `${cell.slice(0, 40)}…` : cell);
}
