import { type ColumnMap } from './column-map';
import { type ColumnPlan, planColumns, ROLE_NAMES } from './column-plan';
import { type Dialect, isFigure, KNOWN_NAMES_OF_A_HEADER, knownNames } from './dialect';
import { GuideLogError } from './guide-log-error';
import { requiredRoles } from './plan-check';

/** A header further down in the file, for the run below it. */
export interface LaterHeader {
  readonly expectedColumns: number;
  /** The columns of the first header at their places here. */
  readonly plan: ColumnPlan;
  /** Columns that the first header does not have: they are not read. */
  readonly notRead: readonly string[];
}

/**
 * What a row further down says as a header. It may have the columns in another order, more of them, or fewer; but time
 * and errors must be there, and in the units of the first header, since the frames of a log stand in the same columns.
 *
 * @returns null: the row is no header. A text: why the lines below it cannot be read.
 */
export function laterHeader(
  row: readonly string[],
  dialect: Dialect,
  first: ColumnPlan,
  map: ColumnMap,
): LaterHeader | string | null {
  if (dialect.headerCells === null) return null;
  const cells = row.map((cell) => cell.trim());
  const isComment = cells[0]?.startsWith(dialect.comment) ?? false;
  if (isComment) cells[0] = cells[0]?.slice(dialect.comment.length).trim() ?? '';
  if (knownNames(cells, map) < KNOWN_NAMES_OF_A_HEADER || cells.some(isFigure)) return null;
  const expectedColumns = cells.length + dialect.expectedColumns - dialect.headerCells.length;
  const plan = planOf({ ...dialect, headerCells: cells, expectedColumns }, map);
  if (typeof plan === 'string') return plan;
  const needed = [...requiredRoles(first), 'date'];
  const missing = first.columns.find(
    ({ role }) => needed.includes(role) && !plan.columns.some((column) => column.role === role),
  );
  if (missing) return `has no column that is known as the ${ROLE_NAMES[missing.role]}`;
  const here = first.columns.map((column) => {
    const same = plan.columns.find(({ role }) => role === column.role);
    // Beyond the row: a blank cell in every line.
    return { ...(same ?? column), index: same?.index ?? expectedColumns };
  });
  const other = here.find(({ unit }, at) => unit !== first.columns[at]?.unit);
  if (other) return `has the ${ROLE_NAMES[other.role]} in another unit than the first header`;
  const notRead = plan.columns
    .filter(({ role }) => !first.columns.some((column) => column.role === role))
    .map(({ name }) => name);
  return { expectedColumns, plan: { ...first, columns: here }, notRead };
}

/** The plan, or why there is none. */
function planOf(dialect: Dialect, map: ColumnMap): ColumnPlan | string {
  try {
    return planColumns(dialect, map);
  } catch (error) {
    // The map does not fit this header; the lines above it are read none the less.
    if (error instanceof GuideLogError) return 'does not fit the column map';
    throw error;
  }
}
