import {
  type ColumnMap,
  type ColumnRole,
  type ColumnUnit,
  UNITS_OF_ROLE,
  UNIT_MAY_BE_LEFT_OUT,
} from './column-map';
import { type Dialect } from './dialect';
import { GuideLogError } from './guide-log-error';
import { knownHeader, plainWords } from './known-headers';

/** Roles as they are called in sentences. */
export const ROLE_NAMES: Readonly<Record<ColumnRole, string>> = {
  time: 'time',
  date: 'date',
  raError: 'RA error',
  decError: 'Dec error',
  xError: 'x error',
  yError: 'y error',
  raCorrection: 'RA correction',
  decCorrection: 'Dec correction',
  raDirection: 'RA direction',
  decDirection: 'Dec direction',
  snr: 'SNR',
  brightness: 'brightness',
  state: 'state',
  run: 'run',
  target: 'target',
  declination: 'declination',
  hourAngle: 'hour angle',
  pierSide: 'pier side',
  ignore: 'ignored column',
};

export interface PlannedColumn {
  readonly role: ColumnRole;
  readonly unit: ColumnUnit | undefined;
  /** 0-based. */
  readonly index: number;
  /** The header's text, or the 1-based number where there is no header. */
  readonly name: string;
  readonly from: 'map' | 'header';
  /** Cells that mean "no value", from the map. */
  readonly sentinels: readonly string[];
}

/** Which column is what. */
export interface ColumnPlan {
  readonly columns: readonly PlannedColumn[];
  /** An ISO time beside another time column: not the time axis, but it tells the instant of the first frame. */
  readonly startColumn: PlannedColumn | null;
  readonly warnings: readonly string[];
}

/**
 * The columns that the map names, and for the roles it does not name those with a recognised header.
 *
 * @throws {GuideLogError} `map-column-missing`, `map-column-unclear`, `map-unit`, `role-twice`.
 */
export function planColumns(dialect: Dialect, map: ColumnMap): ColumnPlan {
  const names = columnNames(dialect);
  const mapped = mappedColumns(names, map);
  const planned = mapped.filter((column) => column.role !== 'ignore');
  const warnings: string[] = [];
  let startColumn: PlannedColumn | null = null;
  for (const column of recognisedColumns(dialect, mapped)) {
    const at = planned.findIndex((other) => other.role === column.role);
    const other = planned[at];
    if (!other) {
      planned.push(column);
      continue;
    }
    const isBetter = other.from === 'header' && unitRank(column) < unitRank(other);
    if (isBetter) planned[at] = column;
    const [read, left] = isBetter ? [column, other] : [other, column];
    if (left.role === 'time' && left.unit === 'iso') startColumn = left;
    else {
      warnings.push(
        `Two columns have the ${ROLE_NAMES[left.role]}: "${read.name}" is read, "${left.name}" is not.`,
      );
    }
  }
  const has = (role: ColumnRole) => planned.some((column) => column.role === role);
  if (has('raError') && has('decError') && (has('xError') || has('yError'))) {
    warnings.push(
      "The errors along RA and Dec are read, those along the camera's axes beside them are not.",
    );
  }
  return { columns: planned, startColumn, warnings };
}

/** Header texts, or 1-based numbers where there is no header. */
export function columnNames(dialect: Dialect): string[] {
  return Array.from(
    { length: Math.max(dialect.expectedColumns, dialect.headerCells?.length ?? 0) },
    (_, index) => dialect.headerCells?.[index] ?? String(index + 1),
  );
}

function mappedColumns(names: readonly string[], map: ColumnMap): PlannedColumn[] {
  const columns = Object.entries(map.columns ?? {}).map(([key, use]): PlannedColumn => {
    const index = columnIndex(names, key);
    const unit = use.unit ?? UNITS_OF_ROLE[use.role][0];
    checkUnit(key, use.role, use.unit);
    const sentinels = use.sentinels ?? [];
    return { role: use.role, unit, index, name: names[index] ?? key, from: 'map', sentinels };
  });
  columns.forEach((column, at) => {
    const sameRole = columns.findIndex((other) => other.role === column.role) !== at;
    if (sameRole && column.role !== 'ignore') {
      throw new GuideLogError(
        'role-twice',
        `The map gives two columns the role ${column.role}: one of them must be ignored.`,
      );
    }
    if (columns.findIndex((other) => other.index === column.index) !== at) {
      throw new GuideLogError('role-twice', `The map names the column "${column.name}" twice.`);
    }
  });
  return columns;
}

function columnIndex(names: readonly string[], key: string): number {
  const byText = names.flatMap((name, index) => (name === key.trim() ? [index] : []));
  const byWords = names.flatMap((name, i) => (plainWords(name) === plainWords(key) ? [i] : []));
  const found = byText.length > 0 ? byText : byWords;
  if (found.length > 1) {
    throw new GuideLogError(
      'map-column-unclear',
      `Two columns are called "${key}": the map must name them by their number.`,
    );
  }
  const number = /^\d+$/.test(key.trim()) ? Number(key) : 0;
  const index = found[0] ?? number - 1;
  if (index < 0 || index >= names.length) {
    throw new GuideLogError(
      'map-column-missing',
      `The map names a column "${key}", which is not in the file; its columns are ${listed(names)}.`,
    );
  }
  return index;
}

function checkUnit(key: string, role: ColumnRole, unit: ColumnUnit | undefined): void {
  const allowed = UNITS_OF_ROLE[role];
  const isMissing =
    unit === undefined && allowed.length > 0 && !UNIT_MAY_BE_LEFT_OUT.includes(role);
  const isWrong = unit !== undefined && !allowed.includes(unit);
  if (!isMissing && !isWrong) return;
  const choice = allowed.length === 0 ? 'no unit' : `one of the units ${listed(allowed)}`;
  throw new GuideLogError(
    'map-unit',
    `The column "${key}" of the map needs ${choice} for the role ${role}${isWrong ? `, not "${unit}"` : ''}.`,
  );
}

function recognisedColumns(dialect: Dialect, mapped: readonly PlannedColumn[]): PlannedColumn[] {
  return (dialect.headerCells ?? []).flatMap((name, index): PlannedColumn[] => {
    const known = knownHeader(name);
    if (!known || mapped.some((column) => column.index === index)) return [];
    return [{ ...known, index, name, from: 'header', sentinels: [] }];
  });
}

function unitRank({ role, unit }: PlannedColumn): number {
  return unit === undefined ? 0 : UNITS_OF_ROLE[role].indexOf(unit);
}

function listed(names: readonly string[]): string {
  const shown = names.slice(0, 12).map((name) => `"${name}"`);
  return shown.join(', ') + (names.length > shown.length ? ' and others' : '');
}
