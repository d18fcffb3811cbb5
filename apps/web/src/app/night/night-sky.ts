import { SKIES, type SkySpell, skySpells } from '@stillpier/analysis';
import type { Site } from '@stillpier/contract';
import { clockText, instantOfLocalTime } from '../figures/clock';
import type { RibbonSky } from '../figures/night-ribbon/ribbon-sky';

const DAY_SECONDS = 86_400;
/** Civil and nautical twilight share a step: the figure has four, from the sun up to the dark. */
const LEVEL_OF_SKY = { day: 0, civil: 1, nautical: 1, astronomical: 2, dark: 3 } as const;

/** The skies of a night from noon to noon at the site; none where the site's place is not known. */
export function nightSpells(site: Site, date: string): SkySpell[] {
  const { latitudeDegrees, longitudeDegrees, timeZone } = site;
  const noonMs = instantOfLocalTime(`${date}T12:00:00`, timeZone);
  if (latitudeDegrees === null || longitudeDegrees === null || noonMs === null) return [];
  const noon = noonMs / 1000;
  return skySpells({ latitudeDegrees, longitudeDegrees }, noon, noon + DAY_SECONDS);
}

/** As the ribbon draws them: neighbours of one level are one. */
export function ribbonSkies(spells: readonly SkySpell[]): RibbonSky[] {
  const skies: RibbonSky[] = [];
  for (const { sky, fromEpochSeconds, toEpochSeconds } of spells) {
    const level = LEVEL_OF_SKY[sky];
    const toMs = toEpochSeconds * 1000;
    const last = skies.at(-1);
    if (last?.level === level) skies[skies.length - 1] = { ...last, toMs };
    else skies.push({ level, fromMs: fromEpochSeconds * 1000, toMs });
  }
  return skies;
}

/** Sunset and the sunrise after it; null where the sun does not set, or does not rise again. */
export function sunDown(skies: readonly RibbonSky[]): { setMs: number; riseMs: number } | null {
  const down = skies.filter(({ level }) => level > 0);
  const [first, last] = [down[0], down.at(-1)];
  const rises = last && skies.at(-1) !== last;
  return first && rises && skies[0] !== first ? { setMs: first.fromMs, riseMs: last.toMs } : null;
}

/** `Sunset 16:32; civil twilight ends 17:08, nautical 17:47, astronomical 18:26; …`, as far as the night goes. */
export function skyText(spells: readonly SkySpell[], timeZone: string): string {
  const time = (seconds: number): string => clockText(seconds * 1000, timeZone);
  const darker = (a: SkySpell, b: SkySpell): boolean => SKIES.indexOf(b.sky) > SKIES.indexOf(a.sky);
  const parts = spells.slice(1).flatMap((spell, i) => {
    const before = spells[i];
    if (!before) return [];
    const at = time(spell.fromEpochSeconds);
    if (before.sky === 'day') return [`sunset ${at}`];
    if (spell.sky === 'day') return [`sunrise ${at}`];
    return [darker(before, spell) ? `${before.sky} dusk to ${at}` : `${spell.sky} dawn from ${at}`];
  });
  const [first, ...rest] = parts;
  if (first === undefined) return '';
  return `${[first.charAt(0).toUpperCase() + first.slice(1), ...rest].join(', ')}.`;
}
