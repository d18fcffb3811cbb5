import {
  type Account,
  type NightSummary,
  type Rig,
  type RigState,
  type Setup,
} from '@stillpier/contract';

// What the server would answer, for specs: whole and on the contract, with the part that matters given.

const RIG_ID = '00000000-0000-4000-8000-000000000001';
const CREATED_AT = '2026-05-09T10:00:00Z';

export function fieldRig(part: Partial<Rig>): Rig {
  return {
    id: RIG_ID,
    name: 'North pier',
    role: 'owner',
    version: 3,
    createdAt: CREATED_AT,
    mount: {
      kind: 'worm',
      wormTeeth: 180,
      wormPeriodSeconds: null,
      gearStages: [{ name: 'belt', periodSeconds: 120 }],
      guideRateSidereal: 0.5,
    },
    site: { latitudeDegrees: 47.1, longitudeDegrees: 15.4, timeZone: 'Europe/Vienna' },
    ...part,
  };
}

export function fieldSetup(part: Partial<Setup>): Setup {
  return {
    id: '00000000-0000-4000-8000-000000000005',
    rigId: RIG_ID,
    version: 2,
    createdAt: CREATED_AT,
    name: 'Refractor',
    imaging: { focalLengthMm: 800, apertureMm: 130, pixelUm: 3.76, binning: 1, sensor: 'mono' },
    filters: [{ name: 'H-alpha', subSeconds: 1200 }],
    guiding: { focalLengthMm: 200, apertureMm: 50, pixelUm: 3.75, binning: 1 },
    seeingFwhmArcsec: 2.5,
    subSeconds: 300,
    keepAspect: 1.15,
    ...part,
  };
}

export function rigState(part: Partial<RigState>): RigState {
  return {
    rigId: RIG_ID,
    nightCount: 34,
    lastNight: null,
    sentence: [],
    footprint: null,
    seeingFwhmArcsec: null,
    imagingScaleArcsecPerPx: null,
    totalRmsTrend: [],
    ...part,
  };
}

export function nightSummary(part: Partial<NightSummary>): NightSummary {
  return {
    date: '2026-11-28',
    startsAt: '2026-11-28T11:00:00Z',
    endsAt: '2026-11-29T11:00:00Z',
    targets: [],
    runCount: 1,
    guidedHours: 8,
    frames: 9000,
    used: 8000,
    raRmsArcsec: 0.65,
    decRmsArcsec: 0.43,
    totalRmsArcsec: 0.78,
    aspect: 1.13,
    positionAngleDegrees: 80,
    keptShare: 0.76,
    mainLimit: null,
    ...part,
  };
}

export function anAccount(part: Partial<Account>): Account {
  return {
    id: '00000000-0000-4000-8000-000000000009',
    email: 'ilse.varga@example.org',
    name: 'Ilse Varga',
    kind: 'member',
    createdAt: CREATED_AT,
    ...part,
  };
}
