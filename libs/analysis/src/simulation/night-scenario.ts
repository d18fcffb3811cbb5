/** A sine in the RA drive, in arcsec of the RA axis: amplitude · cos(2π t / period + phase), t from the log's start. */
export interface DriveLine {
  readonly periodSeconds: number;
  readonly amplitudeArcsec: number;
  readonly phaseDegrees: number;
}

/** Wandering with a standard deviation and a memory (an AR(1) process in time); a long memory makes it a random walk. */
export interface Wandering {
  readonly sigmaArcsec: number;
  readonly memorySeconds: number;
}

/** Factors on the expected response, by the direction in which the star moves. */
export interface ResponseFactors {
  readonly positive: number;
  readonly negative: number;
}

export interface GuiderAxis {
  /** Aggressiveness: part of the measured error that the guider means to remove; 0 leaves the axis unguided. */
  readonly gain: number;
  /** Errors below this are left alone. */
  readonly minimumMoveArcsec: number;
  /** Longest pulse. */
  readonly maximumMs: number;
  /** What the axis does of what the guider means it to do. */
  readonly response: ResponseFactors;
}

export interface RunScenario {
  readonly durationSeconds: number;
  /** Time without frames before this run. */
  readonly pauseSeconds: number;
  readonly target: string;
  readonly declinationDegrees: number;
  /** At the run's first frame, west positive. */
  readonly hourAngleHours: number;
  readonly pierSide: 'east' | 'west';
}

/** Everything that a simulated night is made of. The mount's motions are axis angles, seeing is on the sky. */
export interface NightScenario {
  readonly startEpochSeconds: number;
  readonly cadenceSeconds: number;
  /** Frames come up to this much late, uniformly. */
  readonly cadenceJitterSeconds: number;
  readonly latitudeDegrees: number;
  readonly runs: readonly RunScenario[];
  readonly drive: {
    readonly worm: {
      readonly periodSeconds: number;
      readonly harmonics: readonly {
        readonly order: number;
        readonly amplitudeArcsec: number;
        readonly phaseDegrees: number;
      }[];
    };
    readonly lines: readonly DriveLine[];
    readonly raWandering: Wandering;
    readonly decWandering: Wandering;
    /** Steady drift on the sky beside the polar one (flexure, rate). */
    readonly raDriftArcsecPerMinute: number;
    readonly decDriftArcsecPerMinute: number;
    readonly decBacklashArcsec: number;
  };
  /** Of the polar axis, on the sky: azimuth east positive, altitude up positive. */
  readonly polar: { readonly azimuthArcmin: number; readonly altitudeArcmin: number };
  readonly guider: {
    readonly ra: GuiderAxis;
    readonly dec: GuiderAxis;
    readonly guideRateSidereal: number;
    /** What the log writes: in 'arcsec' the displacement that the guider meant. */
    readonly correctionUnit: 'ms' | 'arcsec';
    /** Whether a logged correction of +1 moves the star towards +error. */
    readonly loggedSign: 'same' | 'opposite';
  };
  readonly seeing: {
    /** New in every frame, per axis. */
    readonly whiteSigmaArcsec: number;
    readonly correlated: Wandering;
  };
  /** Bumps of a normal size that fade away exponentially. */
  readonly gusts: {
    readonly perHour: number;
    readonly sizeArcsec: number;
    readonly fadeSeconds: number;
  };
  readonly dithers: {
    /** 0 for none. */
    readonly everySeconds: number;
    readonly sizeArcsec: number;
    /** Settled after three frames below this on both axes. */
    readonly settledArcsec: number;
  };
  /** No star between these times of the log. */
  readonly clouds: readonly { readonly fromSeconds: number; readonly toSeconds: number }[];
}

/**
 * A plain guided night to vary: one run of two hours on a worm of 480 s, a healthy loop at gain 0.7, seeing of
 * 0.5 ″ a frame, no other fault.
 */
export const PLAIN_NIGHT: NightScenario = {
  startEpochSeconds: 1_773_538_800,
  cadenceSeconds: 2,
  cadenceJitterSeconds: 0,
  latitudeDegrees: 50,
  runs: [
    {
      durationSeconds: 7200,
      pauseSeconds: 0,
      target: 'Field A',
      declinationDegrees: 20,
      hourAngleHours: -2,
      pierSide: 'west',
    },
  ],
  drive: {
    worm: {
      periodSeconds: 480,
      harmonics: [
        { order: 1, amplitudeArcsec: 5, phaseDegrees: 30 },
        { order: 2, amplitudeArcsec: 1.2, phaseDegrees: 110 },
        { order: 3, amplitudeArcsec: 0.4, phaseDegrees: -60 },
      ],
    },
    lines: [],
    raWandering: { sigmaArcsec: 0, memorySeconds: 60 },
    decWandering: { sigmaArcsec: 0, memorySeconds: 60 },
    raDriftArcsecPerMinute: 0,
    decDriftArcsecPerMinute: 0,
    decBacklashArcsec: 0,
  },
  polar: { azimuthArcmin: 0, altitudeArcmin: 0 },
  guider: {
    ra: {
      gain: 0.7,
      minimumMoveArcsec: 0,
      maximumMs: 2500,
      response: { positive: 1, negative: 1 },
    },
    dec: {
      gain: 0.7,
      minimumMoveArcsec: 0,
      maximumMs: 2500,
      response: { positive: 1, negative: 1 },
    },
    guideRateSidereal: 0.5,
    correctionUnit: 'ms',
    loggedSign: 'same',
  },
  seeing: { whiteSigmaArcsec: 0.5, correlated: { sigmaArcsec: 0, memorySeconds: 5 } },
  gusts: { perHour: 0, sizeArcsec: 3, fadeSeconds: 3 },
  dithers: { everySeconds: 0, sizeArcsec: 4, settledArcsec: 1.5 },
  clouds: [],
};
