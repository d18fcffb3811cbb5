import type { ColumnMap, OwnColumnMap } from '@stillpier/contract';
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

/** What a column map says of a file beside its columns. */
export type MapSettings = Omit<ColumnMap, 'columns' | 'states' | 'startTime'>;

/** What a person changed of what the reader makes of a file. */
export interface HandChoice {
  /** A saved map that was taken by hand; what is chosen below wins over it. */
  readonly taken: KnownMap | null;
  readonly settings: MapSettings;
  readonly columns: readonly ColumnChoice[] | null;
}
export const NOTHING_BY_HAND: HandChoice = { taken: null, settings: {}, columns: null };

/** A saved map of the rig or of the person. */
export type KnownMap = Pick<OwnColumnMap, 'id' | 'name' | 'headerCells' | 'map'>;

/** What is known of a file before it is sent. */
export interface Intake {
  /** null: the file cannot be read at all, `fault` says why. */
  readonly preview: GuideLogPreview | null;
  readonly fault: string | null;
  /** As saved maps know the header; empty for a file without one. */
  readonly headerCells: readonly string[];
  readonly choices: readonly ColumnChoice[];
  /** The saved map that fits, when the headers alone are not enough. */
  readonly savedMap: KnownMap | null;
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
  saved: readonly KnownMap[],
  { taken, settings, columns }: HandChoice,
): Intake {
  const bare = attempt(head, {});
  if (typeof bare === 'string') return unreadable(bare);
  const isAsFound = columns === null && Object.keys(settings).length === 0;
  const found = taken ?? (bare.missing === null ? undefined : saved.find(fits(head)));
  const base: ColumnMap = { ...found?.map, ...settings };
  const based = attempt(head, base);
  // A choice that contradicts itself (two columns of one role) is said; the table stays as it was.
  const map = columns ? { ...base, columns: columnsOf(orBare(based, bare), columns, base) } : base;
  const mapped = attempt(head, map);
  const preview = typeof mapped === 'string' ? orBare(based, bare) : mapped;
  const choices =
    columns ?? preview.columns.map(({ role, unit }): ColumnChoice => ({ role, unit }));
  return {
    preview,
    fault: null,
    headerCells: headerCellsOf(preview),
    choices,
    savedMap: isAsFound ? (found ?? null) : null,
    missing: openUnits(preview, choices) ?? (typeof mapped === 'string' ? mapped : mapped.missing),
    needsStart: map.startTime === undefined && tellsNoDate(preview, choices),
    map: isAsFound && !found ? null : map,
  };
}

/** The columns whose unit must still be picked, as a sentence. */
function openUnits({ columns }: GuideLogPreview, choices: readonly ColumnChoice[]): string | null {
  const names = columns
    .filter((_, i) => choices[i] && lacksUnit(choices[i]))
    .map(({ header, number }) => (header?.trim() ? header.trim() : `column ${number}`));
  return names.length === 0 ? null : `Pick a unit: ${names.join(', ')}.`;
}

function orBare(preview: GuideLogPreview | string, bare: GuideLogPreview): GuideLogPreview {
  return typeof preview === 'string' ? bare : preview;
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

function fits(head: Uint8Array): (saved: KnownMap) => boolean {
  return ({ headerCells, map }) => {
    const preview = attempt(head, map);
    if (typeof preview === 'string') return false;
    // A map that came as a file names no header line: it fits where it leaves nothing open.
    if (headerCells === null) return preview.missing === null && namesHeaders(map);
    return JSON.stringify(headerCellsOf(preview)) === JSON.stringify(headerCells);
  };
}

/** By number alone a map would fit nearly every file. */
function namesHeaders({ columns = {} }: ColumnMap): boolean {
  return Object.keys(columns).some((key) => !/^\d+$/.test(key));
}

function headerCellsOf(preview: GuideLogPreview): string[] {
  const cells = preview.columns.map(({ header }) => header ?? '');
  return cells.every((cell) => cell === '') ? [] : cells;
}

/** The columns of a map of what was chosen, by header text where that is one of its kind, else by number. */
function columnsOf(
  { columns }: GuideLogPreview,
  choices: readonly ColumnChoice[],
  base: ColumnMap,
): ColumnMap['columns'] {
  const named = columns.flatMap((column, i): [string, ColumnUseOfMap][] => {
    const { role, unit } = choices[i] ?? { role: null, unit: null };
    if (role === null) return [];
    const isOnly = columns.filter(({ header }) => header === column.header).length === 1;
    const key = column.header?.trim() && isOnly ? column.header : String(column.number);
    const mayDrop = UNIT_MAY_BE_LEFT_OUT.includes(role) || unit === null;
    const sentinels = base.columns?.[key]?.sentinels;
    return [[key, { role, ...(mayDrop ? {} : { unit }), ...(sentinels ? { sentinels } : {}) }]];
  });
  return Object.fromEntries(named);
}

type ColumnUseOfMap = NonNullable<ColumnMap['columns']>[string];

function tellsNoDate(preview: GuideLogPreview, choices: readonly ColumnChoice[]): boolean {
  if (choices.some(({ role }) => role === 'date')) return false;
  const time = choices.find(({ role }) => role === 'time');
  if (!time || !DATELESS_UNITS.includes(time.unit)) return false;
  if (choices.some(({ role }) => role === 'date')) return false;
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
