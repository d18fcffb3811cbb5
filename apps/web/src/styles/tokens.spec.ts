import tokens from './tokens.css' with { loader: 'text' };

const THEMES = ['day', 'night', 'red'] as const;

/** Text on ground: 4.5:1 (WCAG 2.2, success criterion 1.4.3). */
const TEXT_PAIRS = {
  ink: ['paper', 'paper-sunk', 'paper-raised', 'sky-0', 'sky-3', 'usual', 'mark-tint', 'star'],
  'ink-2': ['paper', 'paper-sunk', 'paper-raised', 'usual', 'sky-1', 'sky-3'],
  mark: ['paper', 'paper-sunk', 'paper-raised'],
  'on-ink': ['ink'],
};
/** Graphics and controls on their ground: 3:1 (WCAG 2.2, success criterion 1.4.11). */
const GRAPHIC_PAIRS = {
  ra: ['paper', 'paper-sunk', 'paper-raised', 'sky-3'],
  dec: ['paper', 'paper-sunk', 'paper-raised', 'sky-3'],
  'rule-strong': ['paper', 'paper-sunk', 'paper-raised'],
  hatch: ['paper'],
  'star-edge': ['star', 'paper'],
  mark: ['sky-3', 'usual'],
  focus: ['paper', 'paper-sunk', 'paper-raised'],
};

describe.each(THEMES)('the tokens of the %s theme', (theme) => {
  const colours = coloursOf(theme);
  const ratio = (front: string, ground: string) =>
    contrast(colours.get(front) ?? '', colours.get(ground) ?? '');

  it.each(pairsOf(TEXT_PAIRS))('%s on %s can be read as text', (front, ground) => {
    expect(ratio(front, ground)).toBeGreaterThanOrEqual(4.5);
  });

  it.each(pairsOf(GRAPHIC_PAIRS))('%s on %s can be seen as a graphic', (front, ground) => {
    expect(ratio(front, ground)).toBeGreaterThanOrEqual(3);
  });

  it('names a colour for every role of the day theme', () => {
    expect([...colours.keys()]).toEqual([...coloursOf('day').keys()]);
  });
});

it('keeps red light red: no token of it holds more than a trace of green or blue', () => {
  for (const [role, colour] of coloursOf('red')) {
    const [red, green, blue] = channels(colour);
    // Hues of 0 to 5 degrees, the brightest of them lightened: #ff6a60 holds the most green and blue.
    expect(Math.max(green, blue), role).toBeLessThanOrEqual(0.42 * red);
  }
});

it('reckons black on white as 21 to 1', () => {
  expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10); // WCAG 2.2, definition of contrast ratio
});

function pairsOf(pairs: Record<string, string[]>): [string, string][] {
  return Object.entries(pairs).flatMap(([front, grounds]) =>
    grounds.map((ground): [string, string] => [front, ground]),
  );
}

function coloursOf(theme: string): Map<string, string> {
  const block = new RegExp(`\\.theme-${theme}\\s*\\{([^}]*)\\}`).exec(tokens)?.[1] ?? '';
  return new Map(
    [...block.matchAll(/--([\w-]+):\s*(#[0-9a-f]{6})/g)].map(([, role, colour]) => [
      role!,
      colour!,
    ]),
  );
}

function channels(colour: string): [number, number, number] {
  const bits = Number.parseInt(colour.slice(1), 16);
  return [(bits >> 16) & 255, (bits >> 8) & 255, bits & 255];
}

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
function contrast(a: string, b: string): number {
  const [low, high] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (high! + 0.05) / (low! + 0.05);
}

function luminance(colour: string): number {
  const [red, green, blue] = channels(colour).map((channel) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red! + 0.7152 * green! + 0.0722 * blue!;
}
