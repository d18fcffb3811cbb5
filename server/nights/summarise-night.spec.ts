import { expect, it } from 'vitest';
import { type MeasuredRun, summariseNight } from './summarise-night';

const RUN: MeasuredRun = {
  target: 'Veil',
  startsAt: new Date('2026-03-15T01:00:00Z'),
  durationSeconds: 3600,
  frames: 1800,
  used: 1700,
  raRmsArcsec: 0.6,
  decRmsArcsec: 0.5,
  totalRmsArcsec: 0.78,
  aspect: 1.1,
  positionAngleDegrees: 90,
  subs: 10,
  subsWithin: 9,
  findings: [],
};
const later = (changes: Partial<MeasuredRun>): MeasuredRun => ({
  ...RUN,
  startsAt: new Date('2026-03-15T03:00:00Z'),
  ...changes,
});

// Expected values by the definitions of nightSummarySchema, worked out by hand.
it('a night lasts from its first frame to its last, and adds up what was guided', () => {
  expect(summariseNight([RUN, later({ target: null, durationSeconds: 1800 })])).toMatchObject({
    startsAt: new Date('2026-03-15T01:00:00Z'),
    endsAt: new Date('2026-03-15T03:30:00Z'),
    targets: ['Veil'],
    runCount: 2,
    guidedHours: 1.5,
    frames: 3600,
    used: 3400,
  });
});

it('each measure is the median over the runs, weighted by the frames that count', () => {
  const short = later({ used: 100, raRmsArcsec: 3, aspect: 2, positionAngleDegrees: 10 });
  expect(summariseNight([RUN, short])).toMatchObject({
    ...{ raRmsArcsec: 0.6, aspect: 1.1, positionAngleDegrees: 90 },
  });
});

it('aspect and angle are those of one run: together they are a star', () => {
  const runs = [
    later({ used: 100, aspect: 1.0, positionAngleDegrees: 5 }),
    later({ used: 100, aspect: 1.3, positionAngleDegrees: 170 }),
    later({ used: 100, aspect: 1.2, positionAngleDegrees: 60 }),
  ];
  expect(summariseNight(runs)).toMatchObject({ aspect: 1.2, positionAngleDegrees: 60 });
});

it('the share that is kept counts subs, not runs', () => {
  const short = later({ subs: 2, subsWithin: 0 });
  expect(summariseNight([RUN, short]).keptShare).toBe(0.75);
  expect(summariseNight([later({ subs: null, subsWithin: null })]).keptShare).toBeNull();
});

it('the main limit is the worst finding; of two as bad that of the longer run', () => {
  const watch = { code: 'drift', severity: 'watch' } as const;
  const act = { code: 'periodic-error', severity: 'act' } as const;
  const other = { code: 'gusts', severity: 'act' } as const;
  const runs = [
    later({ findings: [watch] }),
    later({ used: 50, findings: [other] }),
    later({ used: 60, findings: [act, watch] }),
  ];
  expect(summariseNight(runs)).toMatchObject({
    ...{ mainLimitCode: 'periodic-error', mainLimitSeverity: 'act' },
  });
  expect(summariseNight([RUN]).mainLimitCode).toBeNull();
});

it('the sky is the main limit when the mount has nothing to be done about', () => {
  const worm = { code: 'periodic-error', severity: 'fine' } as const;
  const sky = { code: 'seeing-limited', severity: 'fine' } as const;
  expect(summariseNight([later({ findings: [worm, sky] })]).mainLimitCode).toBe('seeing-limited');
});

it('runs that are too short to measure leave the measures open', () => {
  const bare = later({ raRmsArcsec: null, aspect: null, positionAngleDegrees: null });
  expect(summariseNight([bare])).toMatchObject({ raRmsArcsec: null, aspect: null });
});
