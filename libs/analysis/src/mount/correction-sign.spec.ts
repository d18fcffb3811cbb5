import { describe, expect, it } from 'vitest';
import { PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { correctionSignFromLog } from './correction-sign';

const night = (loggedSign: 'same' | 'opposite') => {
  const { frames } = simulateNight(
    { ...PLAIN_NIGHT, guider: { ...PLAIN_NIGHT.guider, loggedSign } },
    1,
  );
  const used = new Uint8Array(frames.count).fill(1);
  const { timeSeconds, raError, raCorrection } = frames;
  return {
    frames: { timeSeconds, cadenceSeconds: 2, used, restartFrames: [] },
    raError,
    raCorrection: raCorrection!,
  };
};

describe('the sign of corrections', () => {
  it.each([
    ['same', 1],
    ['opposite', -1],
  ] as const)('is told by the log: %s', (logged, sign) => {
    const { frames, raError, raCorrection } = night(logged);
    expect(correctionSignFromLog(frames, raError, raCorrection)).toBe(sign);
  });

  it('is not told by corrections that have nothing to do with the motion, nor by a handful', () => {
    const { frames, raError, raCorrection } = night('same');
    const elsewhere = raCorrection.map((_, n) => raCorrection[(n + 1700) % raCorrection.length]!);
    expect(correctionSignFromLog(frames, raError, elsewhere)).toBeNull();
    const few = raCorrection.map((given, n) => (n < 9 ? given : 0));
    expect(correctionSignFromLog(frames, raError, few)).toBeNull();
  });
});
