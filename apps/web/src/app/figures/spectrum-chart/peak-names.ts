export interface Box {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

/** A peak to be named, strongest first, at its place in the plot in pixels. */
export interface PeakPlace {
  readonly xPx: number;
  readonly yPx: number;
  readonly widthPx: number;
}

export interface PlacedName {
  /** Of the list that was given. */
  readonly index: number;
  readonly centrePx: number;
  /** Bottom of the two lines of text. */
  readonly bottomPx: number;
}

export const NAME_HEIGHT_PX = 32;
const LEADER_PX = 9;
const SIDE_STEPS = [0, -0.5, 0.5, -1, 1];

/**
 * Places for the names of peaks: above their peak, moved sideways or up until they meet no other name and no taller
 * part of the curve. A peak for which no place is left keeps its name in the table only.
 */
export function placePeakNames(
  peaks: readonly PeakPlace[],
  plot: Box,
  curveTopPx: (fromPx: number, toPx: number) => number,
): PlacedName[] {
  const taken: Box[] = [];
  const placed: PlacedName[] = [];
  peaks.forEach((peak, index) => {
    const box = SIDE_STEPS.map((step) => boxAbove(peak, step, plot, curveTopPx))
      .filter((candidate) => candidate.top >= plot.top)
      .find((candidate) => !taken.some((other) => meets(candidate, other)));
    if (!box) return;
    taken.push(box);
    placed.push({ index, centrePx: (box.left + box.right) / 2, bottomPx: box.bottom });
  });
  return placed;
}

function boxAbove(
  peak: PeakPlace,
  step: number,
  plot: Box,
  curveTopPx: (fromPx: number, toPx: number) => number,
): Box {
  const half = peak.widthPx / 2;
  const centre = Math.min(
    plot.right - half,
    Math.max(plot.left + half, peak.xPx + step * peak.widthPx),
  );
  const ground = Math.min(peak.yPx, curveTopPx(centre - half, centre + half));
  const bottom = ground - LEADER_PX;
  return { left: centre - half, right: centre + half, top: bottom - NAME_HEIGHT_PX, bottom };
}

function meets(a: Box, b: Box): boolean {
  return a.left < b.right && b.left < a.right && a.top < b.bottom && b.top < a.bottom;
}
