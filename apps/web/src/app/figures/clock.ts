const formats = new Map<string, Intl.DateTimeFormat>();

function format(timeZone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = JSON.stringify([timeZone, options]);
  const known = formats.get(key);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-GB', { timeZone, ...options });
  formats.set(key, made);
  return made;
}

const HOUR_MINUTE = { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' } as const;

/** `21:43` at the site. */
export function clockText(epochMs: number, timeZone: string): string {
  return format(timeZone, HOUR_MINUTE).format(epochMs);
}

/** `21:43:05` at the site. */
export function clockSecondsText(epochMs: number, timeZone: string): string {
  return format(timeZone, { ...HOUR_MINUTE, second: '2-digit' }).format(epochMs);
}

/** `UTC+1`, as the zone stood at that instant. */
export function zoneOffsetText(epochMs: number, timeZone: string): string {
  const parts = format(timeZone, { timeZoneName: 'shortOffset' }).formatToParts(epochMs);
  const name = parts.find((part) => part.type === 'timeZoneName')?.value ?? timeZone;
  return name.replace('GMT', 'UTC').replace('-', '\u2212');
}

/** `28–29 November 2026` for the evening date of a night, which ends at noon of the next day. */
export function nightDatesText(date: string): string {
  const evening = new Date(`${date}T00:00:00Z`);
  const morning = new Date(evening.getTime() + 86_400_000);
  return format('UTC', { day: 'numeric', month: 'long', year: 'numeric' })
    .formatRange(evening, morning)
    .replace(/(\d)\s*–\s*(\d)/, '$1–$2');
}

/** `28 Nov 2026`. */
export function dayText(date: string): string {
  return format('UTC', { day: 'numeric', month: 'short', year: 'numeric' }).format(
    new Date(`${date}T00:00:00Z`),
  );
}

const TICK_STEPS_SECONDS = [1, 2, 5, 10, 30, 60, 120, 300, 600, 900, 1800, 3600, 7200];

/** Round clock times between two instants, at most `most` of them, on even steps of the site's clock. */
export function clockTicks(fromMs: number, toMs: number, most: number, timeZone: string): number[] {
  const span = toMs - fromMs;
  const step =
    1000 * (TICK_STEPS_SECONDS.find((seconds) => span / (seconds * 1000) <= most) ?? 14_400);
  const offsetMs = zoneOffsetMs(fromMs, timeZone);
  const ticks: number[] = [];
  for (let t = Math.ceil((fromMs + offsetMs) / step) * step - offsetMs; t <= toMs; t += step) {
    ticks.push(t);
  }
  return ticks;
}

/** By how much the clock of a zone is ahead of UTC at an instant. */
function zoneOffsetMs(epochMs: number, timeZone: string): number {
  return Date.parse(`${localDateTimeText(epochMs, timeZone)}Z`) - Math.floor(epochMs / 1000) * 1000;
}

/** `2026-11-28T18:42:15` at the site, as a date and time field takes it. */
export function localDateTimeText(epochMs: number, timeZone: string): string {
  const parts = format(timeZone, {
    ...HOUR_MINUTE,
    second: '2-digit',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
  }).formatToParts(epochMs);
  const part = (type: string): string => parts.find((each) => each.type === type)?.value ?? '';
  return `${part('year')}-${part('month')}-${part('day')}T${part('hour')}:${part('minute')}:${part('second')}`;
}

/**
 * The instant at which the clock of a zone shows a local date and time; of an hour that is shown twice the first. null
 * for text that is no date and time.
 */
export function instantOfLocalTime(local: string, timeZone: string): number | null {
  const asUtc = Date.parse(`${local}Z`);
  if (Number.isNaN(asUtc)) return null;
  const dayMs = 86_400_000;
  const before = asUtc - zoneOffsetMs(asUtc - dayMs, timeZone);
  const after = asUtc - zoneOffsetMs(asUtc + dayMs, timeZone);
  const fitting = [before, after].filter((at) => at + zoneOffsetMs(at, timeZone) === asUtc);
  return fitting.length > 0 ? Math.min(...fitting) : before;
}
