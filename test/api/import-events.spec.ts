import { once } from 'node:events';
import { get, type IncomingMessage } from 'node:http';
import {
  accountPaths,
  importPaths,
  type LogImport,
  logImportSchema,
  setupPaths,
} from '@stillpier/contract';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { makeApp, PASSWORD, type TestApp } from '../support/api-app';
import { EXAMPLE_SETUP, guideCsv } from '../support/example-rig';
import { type Cast, castOf } from '../support/rig-members';
import { startTestWorker, type TestWorker, upload, uploaded } from '../support/test-worker';

let app: TestApp;
let cast: Cast;
let worker: TestWorker;
beforeAll(async () => {
  app = await makeApp();
  cast = await castOf(app);
  await cast.owner.post(setupPaths.all(cast.rigId)).send(EXAMPLE_SETUP).expect(201);
  worker = await startTestWorker(app);
});
afterAll(async () => {
  await worker.stop();
  await app.close();
});

/** The events of a stream, as they come. */
async function* eventsOf(email: string, rigId: string, signal: AbortSignal) {
  const signedIn = await app.agent().post(accountPaths.session).send({ email, password: PASSWORD });
  const cookie = String(signedIn.headers['set-cookie']).split(';')[0] ?? '';
  const [answer] = (await once(
    get(app.baseUrl + importPaths.events(rigId), { headers: { cookie }, signal }),
    'response',
  )) as [IncomingMessage];
  expect(answer.headers['content-type']).toMatch(/^text\/event-stream/);
  answer.setEncoding('utf8');
  let text = '';
  for await (const part of answer) {
    text += String(part);
    for (let end = text.indexOf('\n\n'); end >= 0; end = text.indexOf('\n\n')) {
      const [event, data] = text.slice(0, end).split('\n');
      text = text.slice(end + 2);
      if (event === 'event: import') {
        yield logImportSchema.parse(JSON.parse(String(data).replace(/^data: /, '')));
      }
    }
  }
}

it('a stream tells first what is there, then each change to the end', async () => {
  const before = await uploaded(cast.owner, cast.rigId, 'before.csv', guideCsv(60));
  const closing = new AbortController();
  const events = eventsOf('advisor@stillpier.test', cast.rigId, closing.signal);
  expect((await events.next()).value).toEqual(before);

  const sent = await upload(cast.owner, cast.rigId, 'now.csv', guideCsv(20_000, 1)).expect(202);
  const { id } = logImportSchema.parse(sent.body);
  const told: LogImport[] = [];
  for await (const event of events) {
    expect(event.id).toBe(id);
    told.push(event);
    if (event.state === 'done') break;
  }
  closing.abort();
  const progress = told.map((event) => event.progress);
  expect(progress).toEqual([...progress].sort((a, b) => a - b));
  expect(told.map(({ stage }) => stage)).toEqual(
    expect.arrayContaining(['Reading the lines', 'Done']), // it may wait too briefly to be told
  );
});

it('a stream ends when the account is no longer a member', async () => {
  const events = eventsOf('operator@stillpier.test', cast.rigId, new AbortController().signal);
  await events.next();
  const accountId = app.knex('accounts').where({ email: 'operator@stillpier.test' }).select('id');
  await app
    .knex('rigMembers')
    .where({ rigId: cast.rigId })
    .whereIn('accountId', accountId)
    .delete();
  const [last] = [await uploaded(cast.owner, cast.rigId, 'after.csv', guideCsv(60, 2))];
  for await (const event of events) expect(event.id).not.toBe(last.id);
});

it('two streams of two people tell the same', async () => {
  const closing = new AbortController();
  const all = ['owner@stillpier.test', 'advisor@stillpier.test'].map((email) =>
    eventsOf(email, cast.rigId, closing.signal),
  );
  await Promise.all(all.map((events) => events.next()));
  const { id } = await uploaded(cast.owner, cast.rigId, 'shared.csv', guideCsv(60, 3));
  const ends = await Promise.all(
    all.map(async (events) => {
      for await (const event of events) if (event.id === id && event.state === 'done') return event;
      return null;
    }),
  );
  closing.abort();
  expect(ends[0]).toEqual(ends[1]);
  expect(ends[0]?.id).toBe(id);
});
