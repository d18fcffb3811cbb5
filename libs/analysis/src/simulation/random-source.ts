/** A stream of pseudo-random numbers that a seed fixes: the same seed gives the same night everywhere. */
export class RandomSource {
  private state: number;
  private spare: number | null = null;

  /** @param seed Any number; only its lowest 32 bits count. */
  constructor(seed: number) {
    this.state = seed >>> 0;
  }

  /**
   * A generator of its own for one cause, so that switching a cause off leaves the draws of all others as they were.
   *
   * @param cause Text that names the cause, hashed by FNV-1a (Fowler, Noll & Vo; 32 bits).
   */
  static forCause(seed: number, cause: string): RandomSource {
    let hash = 0x811c9dc5 ^ seed;
    for (const character of cause) hash = Math.imul(hash ^ character.charCodeAt(0), 0x01000193);
    return new RandomSource(hash);
  }

  /** Uniform in [0, 1): mulberry32 (T. Ettinger 2017, public domain), period 2³², enough for a night. */
  uniform(): number {
    this.state = (this.state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(this.state ^ (this.state >>> 15), this.state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  }

  /** Normal with mean 0 and standard deviation 1 (Box & Muller 1958, Ann. Math. Stat. 29, 610). */
  normal(): number {
    if (this.spare !== null) {
      const kept = this.spare;
      this.spare = null;
      return kept;
    }
    const radius = Math.sqrt(-2 * Math.log(1 - this.uniform()));
    const angle = 2 * Math.PI * this.uniform();
    this.spare = radius * Math.sin(angle);
    return radius * Math.cos(angle);
  }
}
