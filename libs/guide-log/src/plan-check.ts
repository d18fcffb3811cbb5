import { type ColumnMap, type ColumnRole } from './column-map';
import { type ColumnPlan, ROLE_NAMES } from './column-plan';
import { type DateReading } from './date-order';
import { type Dialect } from './dialect';
import { GuideLogError } from './guide-log-error';

/** What still has to be named before the log can be read, as a sentence; null when nothing is missing. */
function missingColumns(plan: ColumnPlan, dialect: Dialect): string | null {
  const missing = requiredRoles(plan)
    .filter((role) => !hasRole(plan, role))
    .map((role) => `the ${ROLE_NAMES[role]}`);
  if (missing.length === 0) return null;
  const list = [missing.slice(0, -1).join(', '), missing.at(-1)].filter(Boolean).join(' and ');
  const where =
    dialect.headerLine === null ? 'The file' : `The header (line ${dialect.headerLine})`;
  return `${where} has no column that is known as ${list}: a column map must say which it is.`;
}

/** Time and two errors: along RA and Dec, or along the camera's axes where only those are there. */
export function requiredRoles(plan: ColumnPlan): readonly ColumnRole[] {
  return hasCameraErrors(plan) ? ['time', 'xError', 'yError'] : ['time', 'raError', 'decError'];
}

/** Whether the errors are read along the camera's axes: errors along RA and Dec in the same file win. */
export function hasCameraErrors(plan: ColumnPlan): boolean {
  const hasSky = hasRole(plan, 'raError') || hasRole(plan, 'decError');
  return !hasSky && (hasRole(plan, 'xError') || hasRole(plan, 'yError'));
}

/**
 * Whether the log can be read with the plan.
 *
 * @throws {GuideLogError} `columns-unknown`, `units-differ`, `camera-angle`, `date-without-clock`, `date-order-open`.
 */
export function checkPlan(
  plan: ColumnPlan,
  dialect: Dialect,
  dates: DateReading,
  map: ColumnMap,
): void {
  const missing = missingColumns(plan, dialect);
  if (missing !== null) throw new GuideLogError('columns-unknown', missing);
  checkUnitsAgree(plan);
  if (hasCameraErrors(plan) && map.cameraAngleDegrees === undefined) {
    throw new GuideLogError(
      'camera-angle',
      "The errors run along the camera's axes: the column map must say how the camera is turned (cameraAngleDegrees).",
    );
  }
  const time = plan.columns.find((column) => column.role === 'time');
  if (hasRole(plan, 'date') && time?.unit !== 'clock') {
    throw new GuideLogError(
      'date-without-clock',
      'A column of dates needs a time of day beside it: the time column must have the unit "clock".',
    );
  }
  if (dates.openExample !== null) {
    throw new GuideLogError(
      'date-order-open',
      `The date "${dates.openExample}" can be read with the day or with the month first: the column map must say which (dateOrder).`,
    );
  }
}

function checkUnitsAgree(plan: ColumnPlan): void {
  for (const [ra, dec] of [
    ['raError', 'decError'],
    ['xError', 'yError'],
    ['raCorrection', 'decCorrection'],
  ] as const) {
    const units = plan.columns.filter((column) => column.role === ra || column.role === dec);
    if (new Set(units.map((column) => column.unit)).size > 1) {
      throw new GuideLogError(
        'units-differ',
        `${ROLE_NAMES[ra]} and ${ROLE_NAMES[dec]} have different units: both must be in the same one.`,
      );
    }
  }
}

function hasRole(plan: ColumnPlan, role: ColumnRole): boolean {
  return plan.columns.some((column) => column.role === role);
}
