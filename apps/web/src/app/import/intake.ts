import type { ColumnMap, SavedColumnMap } from '@stillpier/contract';
import {
  type ColumnRole,
  type ColumnUnit,
  GuideLogError,
  type GuideLogPreview,
  knownHeader,
  previewGuideLog,
  UNIT_MAY_BE_LEFT_OUT,
  UNITS_OF_ROLE,
} from '@stillpier/guide-log';

/** What a person takes a column for; a null role has not been chosen. */
export interface ColumnChoice {
  readonly role: ColumnRole | null;
  readonly unit: ColumnUnit | null;
}

/** What is known of a file before it is sent. */
export interface Intake {
  /** null: the file cannot be read at all, `fault` says why. */
  readonly preview: GuideLogPreview | null;
  readonly fault: string | null;
  /** As saved maps know the header; empty for a file without one. */
  readonly headerCells: readonly string[];
  readonly choices: readonly ColumnChoice[];
  /** The saved map that fits, when the headers alone are not enough. */
  readonly savedMap: SavedColumnMap | null;
  /** Why it cannot be sent yet, as a sentence. */
  readonly missing: string | null;
  /** Whether its times tell no date. */
  readonly needsStart: boolean;
  /** null: the headers say it all, or the server finds the saved map. */
  readonly map: ColumnMap | null;
}

const DATELESS_UNITS: readonly (ColumnUnit | null)[] = ['seconds', 'milliseconds', 'clock'];

/**
 * What the reader will make of a file: by its headers, else by the first saved map for this header line, else by what
 * was chosen by hand, which wins over both. The server chooses in the same order.
 */
export function intakeOf(
  head: Uint8Array,
  saved: readonly SavedColumnMap[],
  chosen: readonly ColumnChoice[] | null,
): Intake {
  const bare = attempt(head, {});
  if (typeof bare === 'string') return unreadable(bare);
  const savedMap = !chosen && bare.missing !== null ? (saved.find(fits(head)) ?? null) : null;
  const map = chosen ? mapOf(bare, chosen) : (savedMap?.map ?? null);
  const mapped = map ? attempt(head, map) : bare;
  // A choice that contradicts itself (two columns of one role) is said; the table stays as it was.
  const preview = typeof mapped === 'string' ? bare : mapped;
  const choices = chosen ?? preview.columns.map(({ role, unit }): ColumnChoice => ({ role, unit }));
  return {
    preview,
    fault: null,
    headerCells: headerCellsOf(preview),
    choices,
    savedMap,
    missing: typeof mapped === 'string' ? mapped : mapped.missing,
    needsStart: map?.startTime === undefined && tellsNoDate(preview, choices),
    map,
  };
}

function unreadable(fault: string): Intake {
  return {
    preview: null,
    fault,
    headerCells: [],
    choices: [],
    savedMap: null,
    missing: null,
    needsStart: false,
    map: null,
  };
}

/** The preview, or the sentence that says why there is none. */
function attempt(head: Uint8Array, map: ColumnMap): GuideLogPreview | string {
  try {
    return previewGuideLog(head, map);
  } catch (error) {
    if (error instanceof GuideLogError) return error.message; // the reader speaks by throwing
    throw error;
  }
}

function fits(head: Uint8Array): (saved: SavedColumnMap) => boolean {
  return ({ headerCells, map }) => {
    const preview = attempt(head, map);
    return (
      typeof preview !== 'string' &&
      JSON.stringify(headerCellsOf(preview)) === JSON.stringify(headerCells)
    );
  };
}

function headerCellsOf(preview: GuideLogPreview): string[] {
  const cells = preview.columns.map(({ header }) => header ?? '');
  return cells.every((cell) => cell === '') ? [] : cells;
}

/** A map of what was chosen, by header text where that is one of its kind, else by number. */
function mapOf({ columns }: GuideLogPreview, choices: readonly ColumnChoice[]): ColumnMap {
  const named = columns.flatMap((column, i): [string, ColumnUseOfMap][] => {
    const { role, unit } = choices[i] ?? { role: null, unit: null };
    if (role === null) return [];
    const isOnly = columns.filter(({ header }) => header === column.header).length === 1;
    const key = column.header?.trim() && isOnly ? column.header : String(column.number);
    const mayDrop = UNIT_MAY_BE_LEFT_OUT.includes(role) || unit === null;
    return [[key, mayDrop ? { role } : { role, unit: unit }]];
  });
  return { columns: Object.fromEntries(named) };
}

type ColumnUseOfMap = NonNullable<ColumnMap['columns']>[string];

function tellsNoDate(preview: GuideLogPreview, choices: readonly ColumnChoice[]): boolean {
  const time = choices.find(({ role }) => role === 'time');
  if (!time || !DATELESS_UNITS.includes(time.unit)) return false;
  const headers = preview.columns.map(({ header }) => header ?? '');
  return !headers.some((header) => knownHeader(header)?.unit === 'iso');
}

/** The choice after a role was picked: its unit follows where there is only one. */
export function withRole(role: ColumnRole): ColumnChoice {
  const units = UNITS_OF_ROLE[role];
  return { role, unit: units.length === 1 ? (units[0] ?? null) : null };
}

/** Whether a unit must still be picked. */
export function lacksUnit({ role, unit }: ColumnChoice): boolean {
  return (
    role !== null &&
    unit === null &&
    UNITS_OF_ROLE[role].length > 0 &&
    !UNIT_MAY_BE_LEFT_OUT.includes(role)
  );
}
