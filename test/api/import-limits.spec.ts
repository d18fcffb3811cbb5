import { gzipSync } from 'node:zlib';
import { importPaths, problemSchema, setupPaths } from '@stillpier/contract';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { makeApp, type TestApp } from '../support/api-app';
import { EXAMPLE_MAP, EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { startTestWorker, type TestWorker, upload, uploaded } from '../support/test-worker';

const MOST_LINES = 2500;

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
beforeAll(async () => {
  app = await makeApp({ uploadLimitMib: 1 });
  cast = await castOf(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  worker = await startTestWorker(app, { unpackedMib: 1, lines: MOST_LINES });
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});
const send = (name: string, file: string | Buffer, options?: object) =>
  uploaded(cast.owner, cast.rigId, name, file, options);

describe('a log that is compressed by gzip', () => {
  it('is read like the log in it, and kept as it was sent', async () => {
    const packed = gzipSync(guideCsv(2000, 1));
    const done = await send('night.csv.gz', packed);
    expect(done).toMatchObject({ state: 'done', lines: 2001, frames: 2000, progress: 1 });
    expect(done.sizeBytes).toBe(packed.length);
    const original = await cast.owner
      .get(importPaths.original(cast.rigId, done.id))
      .buffer(true)
      .expect(200);
    expect(packed.equals(Buffer.from(original.body as Buffer))).toBe(true);
  });

  it('is told by its bytes and not by its name', async () => {
    expect(await send('night.csv', gzipSync(guideCsv(50, 2)))).toMatchObject({ frames: 50 });
    expect(await send('plain.gz', guideCsv(50, 3))).toMatchObject({ frames: 50 });
  });

  it('may have its header behind many lines of preamble', async () => {
    const preamble = 'a line of preamble that says nothing at all\n'.repeat(900); // 39 KB: more than zlib gives at once
    const options = { setupId: null, map: { ...EXAMPLE_MAP.map, headerLine: 901 } };
    const csv = guideCsv(50, 4).replace(/^[^\n]*/, 'when,east,north,a,b');
    const done = await send('preamble.gz', gzipSync(preamble + csv), options);
    expect(done).toMatchObject({ state: 'done', frames: 50 });
  });

  it('and cut off or damaged, says so', async () => {
    const packed = gzipSync(guideCsv(2000, 5));
    const cutOff = await send('cut-off.gz', packed.subarray(0, packed.length / 2));
    expect(cutOff).toMatchObject({ state: 'failed', attempt: 1 });
    expect(cutOff.error).toMatch(/gzip.*cut off or damaged/);
    const damaged = Buffer.from(packed);
    damaged.fill(0, 200, 260);
    expect((await send('damaged.gz', damaged)).error).toMatch(/cut off or damaged/);
  });

  it('and unpacks to more than the limit, is given up there', async () => {
    const bomb = gzipSync(`${guideCsv(50, 6)}# a comment\n${'#'.repeat(300 * 1024 * 1024)}`);
    expect(bomb.length).toBeLessThan(1024 * 1024);
    const failed = await send('bomb.gz', bomb);
    expect(failed).toMatchObject({ state: 'failed', nights: [] });
    expect(failed.error).toBe(
      'The file unpacks to more than 1 MiB, which is the most that is read.',
    );
  });
});

describe('a log with too many lines', () => {
  const tooMany = guideCsv(MOST_LINES, 7);
  it.each([
    ['ended by LF', tooMany],
    ['ended by CR', tooMany.replaceAll('\n', '\r')],
    ['ended by CR and LF', tooMany.replaceAll('\n', '\r\n')],
    ['without an end of the last', tooMany.trimEnd()],
  ])('%s is refused with the limit', async (_what, csv) => {
    const failed = await send('long.csv', csv);
    expect(failed.error).toBe(
      'The file has more than 2,500 lines, which is the most that is read: send it in parts.',
    );
  });

  it('is read up to the limit', async () => {
    const csv = guideCsv(MOST_LINES - 1, 8).replaceAll('\n', '\r\n');
    expect(await send('full.csv', csv)).toMatchObject({ state: 'done', lines: MOST_LINES });
  });
});

it('a file that is larger than the limit is refused while it is sent', async () => {
  const answer = await upload(cast.owner, cast.rigId, 'large.csv', Buffer.alloc(1024 * 1024 + 1));
  expect(answer.status).toBe(413);
  expect(problemSchema.parse(answer.body).detail).toBe(
    'The file is larger than 1 MiB, which is the most that is taken.',
  );
});
