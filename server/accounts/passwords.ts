import bcrypt from 'bcryptjs';

/** Hashes and compares; the cost comes from outside, since tests have no time for the real one. */
export class Passwords {
  /** A hash that no password has: comparing with it takes as long as with a real one. */
  private readonly nobodysHash: string;

  constructor(private readonly rounds: number) {
    this.nobodysHash = `$2b$${String(rounds).padStart(2, '0')}$${'.'.repeat(53)}`;
  }

  hash(password: string): Promise<string> {
    return bcrypt.hash(password, this.rounds);
  }

  /** Whether the password has this hash; just as slow where there is no hash. */
  async matches(password: string, hash: string | undefined): Promise<boolean> {
    const equal = await bcrypt.compare(password, hash ?? this.nobodysHash);
    return equal && hash !== undefined;
  }
}
