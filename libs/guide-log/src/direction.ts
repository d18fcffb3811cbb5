const POSITIVE = new Set(['e', 'east', 'n', 'north', '+']);
const NEGATIVE = new Set(['w', 'west', 's', 'south', '-', '−']);

/**
 * A correction with the sign that its direction cell gives it: E, N and + are positive. The size counts, whatever sign
 * the log wrote beside the letter. null: the direction is not known, or blank beside a correction that is not 0.
 */
export function correctionWithSign(correction: number, directionCell: string): number | null {
  const letter = directionCell.trim().toLowerCase();
  const size = Math.abs(correction);
  if (POSITIVE.has(letter)) return size;
  if (NEGATIVE.has(letter)) return -size;
  return letter === '' && !(size > 0) ? correction : null;
}

/** Code of a pier side cell in PIER_SIDES. */
export function pierSideCode(cell: string): number {
  const side = cell.trim().toLowerCase();
  if (side === 'east' || side === 'e') return 1;
  return side === 'west' || side === 'w' ? 2 : 0;
}
