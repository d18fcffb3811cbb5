import { describe, expect, it } from 'vitest';
import { sunPosition } from './sun-position';
import { skySpells, sunAltitudeDegrees } from './twilight';

const seconds = (instant: string) => Date.parse(instant) / 1000;

describe('the place of the sun', () => {
  it('is that of Meeus, Astronomical Algorithms, 2nd ed., example 25.a', () => {
    const { rightAscensionHours, declinationDegrees } = sunPosition(2448908.5);
    // 1992 October 13.0: α 198.38083°, δ −7.78507°, printed to five decimals
    expect(rightAscensionHours * 15).toBeCloseTo(198.38083, 4);
    expect(declinationDegrees).toBeCloseTo(-7.78507, 4);
  });

  it('stands at the zenith of the tropic at noon of the solstice', () => {
    // 2024-06-20T20:51Z is the solstice (from memory); the declination is then the obliquity, 23.44°
    const { declinationDegrees } = sunPosition(seconds('2024-06-20T20:51:00Z') / 86400 + 2440587.5);
    expect(declinationDegrees).toBeCloseTo(23.44, 2);
  });
});

describe('the skies of a night', () => {
  const place = { latitudeDegrees: 50.5, longitudeDegrees: 30.5 };

  it('begin and end where the tests of SunCalc (V. Agafonkin, 2013) have them', () => {
    const spells = skySpells(place, seconds('2013-03-05T00:00Z'), seconds('2013-03-06T00:00Z'));
    expect(spells.map(({ sky }) => sky)).toEqual([
      ...['dark', 'astronomical', 'nautical', 'civil', 'day'],
      ...['civil', 'nautical', 'astronomical', 'dark'],
    ]);
    const ends = spells.slice(0, -1).map(({ toEpochSeconds }) => toEpochSeconds);
    const told = ['02:46:17', '03:24:31', '04:02:17', '04:34:56']
      .concat(['15:46:57', '16:19:36', '16:57:22', '17:35:36'])
      .map((time) => seconds(`2013-03-05T${time}Z`));
    // SunCalc takes one declination for the day: near the equinox that is worth a minute and a half at dawn and dusk
    ends.forEach((end, i) => {
      expect(Math.abs(end - (told[i] ?? NaN))).toBeLessThan(100);
    });
  });

  it('leave the sun at the altitude that ends them', () => {
    const spells = skySpells(place, seconds('2026-11-28T11:00Z'), seconds('2026-11-29T11:00Z'));
    const altitudes = spells
      .slice(0, 4)
      .map(({ toEpochSeconds }) => sunAltitudeDegrees(toEpochSeconds, place));
    // by definition; half a second of time moves the sun by less than 0.0021°
    [-50 / 60, -6, -12, -18].forEach((limit, i) => {
      expect(altitudes[i]).toBeCloseTo(limit, 2);
    });
  });

  it('follow each other without gap or overlap', () => {
    const [from, to] = [seconds('2026-03-14T16:00Z'), seconds('2026-03-15T16:00Z')];
    const spells = skySpells({ latitudeDegrees: 0, longitudeDegrees: -75 }, from, to);
    expect(spells[0]?.fromEpochSeconds).toBe(from);
    expect(spells.at(-1)?.toEpochSeconds).toBe(to);
    spells.slice(1).forEach((spell, i) => {
      expect(spell.fromEpochSeconds).toBe(spells[i]?.toEpochSeconds);
    });
  });

  it('never grow dark in the far north in June, nor bright at the pole in December', () => {
    const june = skySpells(
      { latitudeDegrees: 69.65, longitudeDegrees: 18.96 },
      seconds('2026-06-20T10:00Z'),
      seconds('2026-06-21T10:00Z'),
    );
    expect(june.map(({ sky }) => sky)).toEqual(['day']);
    const december = skySpells(
      { latitudeDegrees: 90, longitudeDegrees: 0 },
      seconds('2026-12-20T10:00Z'),
      seconds('2026-12-21T10:00Z'),
    );
    expect(december.map(({ sky }) => sky)).toEqual(['dark']);
  });

  it('are none for a stretch without length', () => {
    expect(skySpells(place, 0, 0)).toEqual([]);
  });
});
