import {
  importPaths,
  nightPaths,
  nightSchema,
  nightSummarySchema,
  pageOf,
  rigPaths,
  rigSchema,
  rigStateSchema,
  setupPaths,
  spectrumCurveSchema,
} from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import * as z from 'zod';
import { unpackFloat32 } from '../../server/nights/packed-series';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_RIG, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { startTestWorker, type TestWorker, uploaded } from '../support/test-worker';

const nightPageSchema = pageOf(nightSummarySchema);
const FRAMES = 600;

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
let runId: string;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  worker = await startTestWorker(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  const evenings = ['2026-03-15T01:40:00Z', '2026-03-16T01:00:00Z', '2026-03-18T02:00:00Z'];
  for (const [variant, start] of evenings.entries()) {
    const csv = guideCsv(FRAMES, variant, start);
    await uploaded(cast.owner, cast.rigId, `${variant}.csv`, csv);
  }
  runId = (await night('2026-03-14')).runs[0]?.id ?? '';
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

async function night(date: string) {
  const answer = await cast.advisor.get(nightPaths.one(cast.rigId, date)).expect(200);
  return nightSchema.parse(answer.body);
}

/** The binary form of the contract, taken apart. */
async function series(query: object) {
  const answer = await cast.advisor
    .get(nightPaths.series(cast.rigId, runId))
    .query(query)
    .buffer(true)
    .expect(200);
  const bytes = Buffer.from(answer.body as Buffer);
  const count = bytes.readUInt32LE(0);
  const columns = (bytes.length - 8) / 4 / count;
  const column = (i: number) =>
    unpackFloat32(bytes.subarray(8 + i * count * 4, 8 + (i + 1) * count * 4));
  return { count, thinned: bytes.readUInt32LE(4), columns, column };
}

describe('a night', () => {
  it('tells what the document tells, between its neighbours', async () => {
    const middle = await night('2026-03-15');
    expect(middle).toMatchObject({
      ...{ rigName: EXAMPLE_RIG.name, timeZone: 'America/Toronto' },
      ...{ previous: '2026-03-14', next: '2026-03-17' },
    });
    const [only] = middle.runs;
    expect(only).toMatchObject({ setupName: EXAMPLE_SETUP.name, seeingFwhmArcsec: 2.5 });
    expect(middle.summary).toMatchObject({
      ...{ runCount: 1, frames: FRAMES, used: only?.run.used },
      ...{ raRmsArcsec: only?.run.ra?.rmsArcsec, totalRmsArcsec: only?.run.total?.rmsArcsec },
      ...{ aspect: only?.run.footprint?.aspect },
    });
    expect(middle.sentence.some(({ strong }) => strong)).toBe(true);
  });

  it('is listed newest first, in pages', async () => {
    const page = async (query: object) =>
      nightPageSchema.parse(
        (await cast.advisor.get(nightPaths.all(cast.rigId)).query(query).expect(200)).body,
      );
    const first = await page({ limit: 2 });
    expect(first.items.map(({ date }) => date)).toEqual(['2026-03-17', '2026-03-15']);
    const rest = await page({ limit: 2, cursor: first.next });
    expect(rest.items.map(({ date }) => date)).toEqual(['2026-03-14']);
    expect(rest.next).toBeNull();
    const wrong = cast.advisor.get(nightPaths.all(cast.rigId)).query({ cursor: 'yesterday' });
    expect((await wrong).status).toBe(400);
  });

  it('that the rig does not have is not found', async () => {
    expect((await cast.owner.get(nightPaths.one(cast.rigId, '2020-01-01'))).status).toBe(404);
    expect((await cast.owner.get(nightPaths.one(cast.rigId, 'today'))).status).toBe(404);
  });

  it('is another one when the site turns out to lie in another time zone', async () => {
    const made = await cast.owner.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
    const path = rigPaths.one(rigSchema.parse(made.body).id);
    const rigId = rigSchema.parse(made.body).id;
    // 15:30 UTC: in Toronto 11:30, still the evening before; in Lisbon 15:30, the same day
    const done = await uploaded(
      cast.owner,
      rigId,
      'x.csv',
      guideCsv(60, 9, '2026-03-15T15:30:00Z'),
    );
    expect(done.nights).toEqual(['2026-03-14']);
    const site = { ...EXAMPLE_RIG.site, timeZone: 'Europe/Lisbon' };
    await cast.owner
      .put(path)
      .set('If-Match', '"1"')
      .send({ ...EXAMPLE_RIG, site })
      .expect(200);
    await cast.owner.get(nightPaths.one(rigId, '2026-03-15')).expect(200);
    await cast.owner.get(nightPaths.one(rigId, '2026-03-14')).expect(404);
    const after = await cast.owner.get(importPaths.one(rigId, done.id)).expect(200);
    expect(after.body).toMatchObject({ nights: ['2026-03-15'] });
  });
});

describe('the series of a run', () => {
  it('are every frame when they fit', async () => {
    const all = await series({ channels: 'raError,setAside', points: 1000 });
    expect(all).toMatchObject({ count: FRAMES, thinned: 0, columns: 3 });
    expect([...all.column(0)].slice(0, 3)).toEqual([0, 2, 4]);
    // 0.8 sin(0) + 0.3 sin(0) and so on: the formula of guideCsv, to the three decimals of the file
    expect(all.column(1)[0]).toBe(0);
    expect(all.column(1)[30]).toBeCloseTo(0.8 + 0.3 * Math.sin(900), 3);
  });

  it('are the least and greatest of each step when they do not', async () => {
    const all = (await series({ channels: 'raError', points: 1000 })).column(1);
    const thin = await series({ channels: 'raError', points: 50 });
    expect(thin).toMatchObject({ count: 50, thinned: 1, columns: 3 });
    expect(Math.min(...thin.column(1))).toBe(Math.min(...all));
    expect(Math.max(...thin.column(2))).toBe(Math.max(...all));
  });

  it('of a stretch begin at its start', async () => {
    const part = await series({ channels: 'decError', fromSeconds: 101, toSeconds: 110 });
    expect([...part.column(0)]).toEqual([1, 3, 5, 7, 9]); // frames at 102 to 110 s
    const all = await series({ channels: 'decError', points: 1000 });
    expect([...part.column(1)]).toEqual([...all.column(1).subarray(51, 56)]);
  });

  it('are all gap for a channel that the log does not have', async () => {
    await app.knex('runSeries').where({ runId, channel: 'decUncorrected' }).delete();
    const none = await series({ channels: 'decUncorrected', toSeconds: 20 });
    expect([...none.column(1)]).toEqual(new Array(11).fill(NaN));
  });

  it.each(['channels=', 'channels=colour', 'channels=raError&points=5', ''])(
    'are refused for the query "%s"',
    async (query) => {
      const path = `${nightPaths.series(cast.rigId, runId)}?${query}`;
      expect((await cast.owner.get(path)).status).toBe(400);
    },
  );
});

it('the spectrum of a run shows its strongest line where the document names it', async () => {
  const answer = await cast.advisor.get(nightPaths.spectrum(cast.rigId, runId)).expect(200);
  const curve = spectrumCurveSchema.parse(answer.body);
  const highest = curve.raAmplitudeArcsec.indexOf(Math.max(...curve.raAmplitudeArcsec));
  // 120 frames of 2 s: the sine of guideCsv. A bin of 20 minutes is 20 % wide at 240 s.
  expect(curve.periodSeconds[highest]).toBeGreaterThan(200);
  expect(curve.periodSeconds[highest]).toBeLessThan(290);
});

it('the rigs page tells how each rig stands after its last night', async () => {
  const answer = await cast.advisor.get(nightPaths.rigStates).expect(200);
  const [state] = z.array(rigStateSchema).parse(answer.body);
  expect(state).toMatchObject({ rigId: cast.rigId, nightCount: 3, seeingFwhmArcsec: 2.5 });
  expect(state?.lastNight?.date).toBe('2026-03-17');
  expect(state?.totalRmsTrend.map(({ date }) => date)).toEqual([
    ...['2026-03-14', '2026-03-15', '2026-03-17'],
  ]);
  expect(state?.imagingScaleArcsecPerPx).toBeCloseTo(1.4633, 4); // REPORT, "The document": 530 mm, 3.76 µm

  await cast.stranger.post(rigPaths.all).send(EXAMPLE_RIG).expect(201);
  const empty = await cast.stranger.get(nightPaths.rigStates).expect(200);
  expect(z.array(rigStateSchema).parse(empty.body)).toMatchObject([
    { nightCount: 0, lastNight: null, footprint: null, totalRmsTrend: [] },
  ]);
});
