import type { RigDescription, SimulatedNight } from '@stillpier/analysis';
import type { ColumnMap } from '@stillpier/guide-log';

/** What the document must say of a sample, as the simulator's truth or the scenario has it. */
export interface Claim {
  /** Place in the document: `runs[0].ra.rmsArcsec`. */
  readonly path: string;
  /** The same for people: "RMS of the RA error". */
  readonly says: string;
  readonly unit: string;
  readonly value: number | string | null;
  /** Largest difference that is right; 0 for counts and texts. */
  readonly within: number;
}

export interface GoodSample {
  readonly file: string;
  /** One or two sentences: what is in the log. */
  readonly shows: string;
  readonly night: SimulatedNight;
  readonly content: string | Uint8Array;
  readonly rig: RigDescription;
  readonly map?: ColumnMap;
  readonly claims: readonly Claim[];
}

export interface FaultySample {
  readonly file: string;
  readonly shows: string;
  readonly content: string | Uint8Array;
  readonly map?: ColumnMap;
  /** The one sentence that the command ends with. */
  readonly complaint: string;
}

/** `samples/expected.json`: what the spec of the samples checks. */
export interface ExpectedSamples {
  readonly ok: readonly ExpectedFile<{ readonly claims: readonly Claim[] }>[];
  readonly notOk: readonly ExpectedFile<{ readonly complaint: string }>[];
}

type ExpectedFile<Expectation> = Expectation & {
  readonly file: string;
  readonly shows: string;
  readonly map: string | null;
  readonly rig: string | null;
};
