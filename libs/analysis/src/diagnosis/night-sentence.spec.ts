import { describe, expect, it } from 'vitest';
import { type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { diagnosed, guidedBy, QUIET_AIR, WHOLE_RIG, withDrive } from './night-fixture';
import { nightSentence } from './night-sentence';

const quiet = (scenario: NightScenario): NightScenario => ({ ...scenario, seeing: QUIET_AIR });
const runsOf = (scenario: NightScenario) => diagnosed(scenario, 1, WHOLE_RIG).runs;
const text = (scenario: NightScenario) =>
  nightSentence(runsOf(scenario))
    .map((piece) => piece.text)
    .join('');
const line = (periodSeconds: number) => ({
  worm: { ...PLAIN_NIGHT.drive.worm, harmonics: [] },
  lines: [{ periodSeconds, amplitudeArcsec: 2, phaseDegrees: 0 }],
});
const strongWorm = {
  worm: { periodSeconds: 480, harmonics: [{ order: 1, amplitudeArcsec: 20, phaseDegrees: 0 }] },
};

describe('the sentence of a night', () => {
  const nights: [NightScenario, RegExp][] = [
    [
      PLAIN_NIGHT,
      /^The sky limited your stars, not the mount\. Seeing made 0\.\d\d″ of the 0\.\d\d″ RMS\.$/,
    ],
    [
      quiet(withDrive(strongWorm)),
      /^RA periodic error limited this night: without it RMS would fall from 0\.\d\d″ to 0\.\d\d″\.$/,
    ],
    [quiet(withDrive(line(37))), /^The transfer gear in RA limited/],
    [quiet(withDrive(line(23))), /^RA motion every 23\.\d s limited/],
    [guidedBy(PLAIN_NIGHT, { gain: 1.6 }), /^(RA|Dec) over-correction limited/],
    [
      { ...PLAIN_NIGHT, gusts: { perHour: 60, sizeArcsec: 6, fadeSeconds: 3 } },
      /^Gusts and bumps limited this night: without them/,
    ],
  ];
  it.each(nights)('names the cause first, then the gain', (scenario, pattern) => {
    expect(text(scenario)).toMatch(pattern);
    expect(text(scenario).split(/\s+/).length).toBeLessThanOrEqual(34); // DESIGN 7
  });

  it('marks its numbers', () => {
    const strong = nightSentence(runsOf(PLAIN_NIGHT)).filter((piece) => piece.strong);
    expect(strong.map((piece) => piece.text)).toEqual([
      expect.stringMatching(/^\d\.\d\d″$/),
      expect.stringMatching(/^\d\.\d\d″$/),
    ]);
  });

  it('says that nothing can be told where the log does not tell the mount', () => {
    const unknown = runsOf(PLAIN_NIGHT).map((run) => ({ ...run, budget: null }));
    const sentence = nightSentence(unknown)
      .map((piece) => piece.text)
      .join('');
    expect(sentence).toContain('cannot be told from this log');
    expect(sentence.split(/\s+/).length).toBeLessThanOrEqual(34);
  });

  it('speaks of nothing where no run was analysed', () => {
    const listed = runsOf(PLAIN_NIGHT).map((run) => ({ ...run, total: null }));
    expect(nightSentence(listed)).toEqual([
      { text: 'No run of this night could be analysed.', strong: false },
    ]);
    expect(nightSentence([])).toHaveLength(1);
  });
});
