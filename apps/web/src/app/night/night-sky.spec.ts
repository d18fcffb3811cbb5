import type { Site } from '@stillpier/contract';
import { nightSpells, ribbonSkies, skyText, sunDown } from './night-sky';

const SITE: Site = { latitudeDegrees: 50.5, longitudeDegrees: 30.5, timeZone: 'UTC' };

describe('the skies of a night', () => {
  it('run from noon to noon in four levels, civil and nautical twilight as one', () => {
    const skies = ribbonSkies(nightSpells(SITE, '2013-03-05'));
    expect(skies.map(({ level }) => level)).toEqual([0, 1, 2, 3, 2, 1, 0]);
    expect(skies[0]?.fromMs).toBe(Date.parse('2013-03-05T12:00Z'));
    expect(skies.at(-1)?.toMs).toBe(Date.parse('2013-03-06T12:00Z'));
  });

  it('say sunset, twilights and sunrise in order', () => {
    // SunCalc's tests (V. Agafonkin, 2013) have 15:46:57, 16:19:36, 16:57:22 and 17:35:36 for this evening, to a minute
    expect(skyText(nightSpells(SITE, '2013-03-05'), 'UTC')).toMatch(
      /^Sunset 15:46, civil dusk to 16:1[89], nautical dusk to 16:5[67], astronomical dusk to 17:3[45], .*sunrise 04:3\d\.$/,
    );
  });

  it('have no sunset in the summer of the far north, and none at all without a site', () => {
    const north = ribbonSkies(nightSpells({ ...SITE, latitudeDegrees: 70 }, '2026-06-20'));
    expect(sunDown(north)).toBeNull();
    expect(nightSpells({ ...SITE, latitudeDegrees: null }, '2013-03-05')).toEqual([]);
    expect(skyText([], 'UTC')).toBe('');
  });
});
