/** What an SVG figure is made of. `look` names the classes of drawing.scss; colours stand there, as tokens. */
export type Shape = LineShape | RectShape | PathShape | CircleShape | TextShape;

interface Looks {
  readonly look: string;
}

interface LineShape extends Looks {
  readonly kind: 'line';
  readonly x1: number;
  readonly y1: number;
  readonly x2: number;
  readonly y2: number;
}

interface RectShape extends Looks {
  readonly kind: 'rect';
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  /** Name of a pattern of the drawing, laid over the look. */
  readonly pattern?: PatternName;
}

interface PathShape extends Looks {
  readonly kind: 'path';
  readonly d: string;
}

interface CircleShape extends Looks {
  readonly kind: 'circle';
  readonly cx: number;
  readonly cy: number;
  readonly r: number;
}

interface TextShape extends Looks {
  readonly kind: 'text';
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly anchor: 'start' | 'middle' | 'end';
}

export const PATTERNS = ['hatch', 'lines', 'uprights', 'dots', 'chevrons'] as const;
export type PatternName =
  'hatch' | `${Exclude<(typeof PATTERNS)[number], 'hatch'>}-${'ra' | 'dec'}`;

const NARROWEST_HATCH_PX = 3.2;

export const line = (x1: number, y1: number, x2: number, y2: number, look: string): Shape => ({
  kind: 'line',
  x1,
  y1,
  x2,
  y2,
  look,
});

export const rect = (
  x: number,
  y: number,
  width: number,
  height: number,
  look: string,
): RectShape => ({
  kind: 'rect',
  x,
  y,
  width: Math.max(0, width),
  height: Math.max(0, height),
  look,
});

export const path = (d: string, look: string): Shape => ({ kind: 'path', d, look });

export const circle = (cx: number, cy: number, r: number, look: string): Shape => ({
  kind: 'circle',
  cx,
  cy,
  r,
  look,
});

export const text = (
  x: number,
  y: number,
  words: string,
  look: string,
  anchor: 'start' | 'middle' | 'end' = 'start',
): Shape => ({ kind: 'text', x, y, text: words, look, anchor });

/** Frames that are set aside: hatched over paper, wide enough to be seen. */
export function hatched(x: number, y: number, width: number, height: number): Shape[] {
  const wide = Math.max(NARROWEST_HATCH_PX, width);
  const tall = Math.max(NARROWEST_HATCH_PX, height);
  return [
    rect(x, y, wide, tall, 'paper'),
    { ...rect(x, y, wide, tall, 'patterned'), pattern: 'hatch' },
  ];
}
