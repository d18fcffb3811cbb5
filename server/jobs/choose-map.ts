import { type ColumnMap, GuideLogError, previewGuideLog } from '@stillpier/guide-log';

interface SavedMap {
  readonly headerCells: readonly string[];
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
    const columns = previewWith(firstBytes, map)?.columns.map(({ header }) => header ?? '');
    const headers = columns?.every((cell) => cell === '') ? [] : columns;
    return JSON.stringify(headers) === JSON.stringify(headerCells);
  };
  return saved.find(fits)?.map ?? {};
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
