import { FRAME_STATES, type FrameState } from '../series/log-frames';
import { type NightScenario } from './night-scenario';
import { RandomSource } from './random-source';

const SETTLED_FRAMES = 3;

/** Moves the lock position now and then, and tells dither and settling apart. */
export class Dithering {
  private readonly random: RandomSource;
  private lastSeconds = 0;
  private state: FrameState = 'guiding';
  private quietFrames = 0;

  constructor(
    private readonly scenario: NightScenario,
    seed: number,
  ) {
    this.random = RandomSource.forCause(seed, 'dithers');
  }

  moveBefore(runSeconds: number): { ra: number; dec: number } {
    const { everySeconds, sizeArcsec } = this.scenario.dithers;
    if (runSeconds === 0) {
      this.lastSeconds = 0;
      this.state = 'guiding';
    }
    if (everySeconds === 0 || runSeconds - this.lastSeconds < everySeconds)
      return { ra: 0, dec: 0 };
    this.lastSeconds = runSeconds;
    this.state = 'dither';
    const angle = 2 * Math.PI * this.random.uniform();
    return { ra: sizeArcsec * Math.cos(angle), dec: sizeArcsec * Math.sin(angle) };
  }

  stateOf(raError: number, decError: number): number {
    if (this.state === 'dither') {
      this.state = 'settling';
      this.quietFrames = 0;
      return stateCode('dither');
    }
    if (this.state === 'settling') {
      const quiet = Math.hypot(raError, decError) < this.scenario.dithers.settledArcsec;
      this.quietFrames = quiet ? this.quietFrames + 1 : 0;
      if (this.quietFrames < SETTLED_FRAMES) return stateCode('settling');
      this.state = 'guiding';
    }
    return stateCode('guiding');
  }
}

/** The number by which a log's frames carry a state. */
export function stateCode(state: FrameState): number {
  return FRAME_STATES.indexOf(state);
}
