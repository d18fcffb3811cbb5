import { type ColumnMap, GuideLogError, previewGuideLog } from '@stillpier/guide-log';

interface SavedMap {
  /** null: every header line that has the columns which the map names. */
  readonly headerCells: readonly string[] | null;
  readonly map: ColumnMap;
}

/**
 * How a file is to be read: as it was asked for; else by itself, when its headers are recognised; else by the first
 * saved map that was made for this header line; else by itself, so that the reader says what is missing.
 */
export function chooseMap(
  firstBytes: Uint8Array,
  asked: ColumnMap | null,
  saved: readonly SavedMap[],
): ColumnMap {
  if (asked) return asked;
  if (previewWith(firstBytes, {})?.missing === null) return {};
  const fits = ({ headerCells, map }: SavedMap): boolean => {
    const preview = previewWith(firstBytes, map);
    if (headerCells === null) return preview?.missing === null && namesHeaders(map);
    const columns = preview?.columns.map(({ header }) => header ?? '');
    const headers = columns?.every((cell) => cell === '') ? [] : columns;
    return JSON.stringify(headers) === JSON.stringify(headerCells);
  };
  return saved.find(fits)?.map ?? {};
}

/** Whether a map names columns by their headers: by number alone it would fit nearly every file. */
function namesHeaders({ columns = {} }: ColumnMap): boolean {
  return Object.keys(columns).some((key) => !/^\d+$/.test(key));
}

/** null for a file that cannot be previewed this way: the reader says why when it comes to it. */
function previewWith(firstBytes: Uint8Array, map: ColumnMap) {
  try {
    return previewGuideLog(firstBytes, map);
  } catch (error) {
    if (error instanceof GuideLogError) return null;
    throw error;
  }
}
