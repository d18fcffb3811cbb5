import { circle, line, path, text, type Shape } from '../drawing/shapes';

export interface DialBin {
  /** Of a turn, 0 to 1. */
  readonly phase: number;
  readonly medianArcsec: number | null;
  readonly q1Arcsec: number | null;
  readonly q3Arcsec: number | null;
}

const REFERENCE_SHARE = 0.265;
const RIM_INSET_PX = 23;
const RINGS_ARCSEC = 5;

/** The largest size that the dial of these bins must hold, in whole rings of 5″. */
export function dialReachArcsec(bins: readonly DialBin[]): number {
  const sizes = bins.flatMap((bin) =>
    [bin.medianArcsec, bin.q1Arcsec, bin.q3Arcsec].map((value) => Math.abs(value ?? 0)),
  );
  return Math.max(RINGS_ARCSEC, Math.ceil(Math.max(0, ...sizes) / RINGS_ARCSEC) * RINGS_ARCSEC);
}

/** Phase 0 at the top, clockwise; the solid circle is zero, outwards is positive. */
export function dialShapes(bins: readonly DialBin[], sizePx: number): Shape[] {
  const centre = sizePx / 2;
  const reference = sizePx * REFERENCE_SHARE;
  const reach = dialReachArcsec(bins);
  // The same step inwards and outwards, and nothing may cross the middle or the rim.
  const pxPerArcsec = (0.96 * Math.min(centre - RIM_INSET_PX - 7 - reference, reference)) / reach;
  const point = (phase: number, arcsec: number): string => {
    const angle = phase * 2 * Math.PI - Math.PI / 2;
    const radius = reference + arcsec * pxPerArcsec;
    return `${(centre + radius * Math.cos(angle)).toFixed(2)} ${(centre + radius * Math.sin(angle)).toFixed(2)}`;
  };
  return [
    ...rings(reach).map((arcsec) =>
      circle(centre, centre, reference + arcsec * pxPerArcsec, 'gridline'),
    ),
    path(
      `${outline(bins, (bin) => bin.q3Arcsec, point)}${outline([...bins].reverse(), (bin) => bin.q1Arcsec, point)}`,
      'ra-tint',
    ),
    circle(centre, centre, reference, 'ink'),
    path(
      outline(bins, (bin) => bin.medianArcsec, point),
      'median',
    ),
    ...rim(sizePx),
    ...rings(reach)
      .filter((arcsec) => Math.abs(arcsec) === labelledRing(reach))
      .map((arcsec) =>
        text(
          centre,
          centre - reference - arcsec * pxPerArcsec + 4,
          `${arcsec > 0 ? '+' : '\u2212'}${Math.abs(arcsec)}″`,
          'axis halo',
          'middle',
        ),
      ),
    text(centre + reference, centre + 4, '0', 'axis halo', 'middle'),
  ];
}

/** Every 5″, wider apart for a mount that swings far. */
export function ringStepArcsec(reach: number): number {
  return reach <= 20 ? RINGS_ARCSEC : Math.ceil(reach / 4 / RINGS_ARCSEC) * RINGS_ARCSEC;
}

function rings(reach: number): number[] {
  const step = ringStepArcsec(reach);
  const outward = Array.from({ length: Math.floor(reach / step) }, (_, i) => (i + 1) * step);
  return [...outward.map((arcsec) => -arcsec).reverse(), ...outward];
}

function labelledRing(reach: number): number {
  return (
    ringStepArcsec(reach) * Math.max(1, Math.min(2, Math.floor(reach / ringStepArcsec(reach))))
  );
}

function outline(
  bins: readonly DialBin[],
  value: (bin: DialBin) => number | null,
  point: (phase: number, arcsec: number) => string,
): string {
  const points = bins.flatMap((bin) => {
    const arcsec = value(bin);
    return arcsec === null ? [] : [point(bin.phase, arcsec)];
  });
  return points.length < 3 ? '' : `M${points.join('L')}Z`;
}

function rim(sizePx: number): Shape[] {
  const centre = sizePx / 2;
  const radius = centre - RIM_INSET_PX;
  const ticks = Array.from({ length: 48 }, (_, i) => {
    const angle = (i / 48) * 2 * Math.PI - Math.PI / 2;
    const length = i % 12 === 0 ? 8 : i % 4 === 0 ? 5 : 3;
    const at = (r: number): [number, number] => [
      centre + r * Math.cos(angle),
      centre + r * Math.sin(angle),
    ];
    return line(...at(radius), ...at(radius + length), 'ink');
  });
  return [
    circle(centre, centre, radius, 'base'),
    ...ticks,
    text(centre, 11, '0', 'axis', 'middle'),
    text(sizePx, centre + 4, '¼', 'axis', 'end'),
    text(centre, sizePx - 1, '½ turn', 'axis', 'middle'),
    text(0, centre + 4, '¾', 'axis'),
  ];
}
