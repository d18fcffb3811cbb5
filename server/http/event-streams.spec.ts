import { createServer, type Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import express from 'express';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import { type EventStream, EventStreams } from './event-streams';

let server: Server;
let streams: EventStreams;
let opened: EventStream[];
const onEnd = vi.fn<() => void>();

beforeEach(async () => {
  onEnd.mockClear();
  opened = [];
  streams = new EventStreams();
  const app = express();
  app.get('/', (_req, res) => {
    const stream = streams.open(res, onEnd);
    opened.push(stream);
    stream.send('import', { state: 'running' });
  });
  server = createServer(app);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
});
afterEach(() => {
  server.closeAllConnections();
  server.close();
});

const open = () => fetch(`http://127.0.0.1:${(server.address() as AddressInfo).port}/`);

it('sends events as they come, and ends when all streams are closed', async () => {
  const answer = await open();
  expect(answer.headers.get('content-type')).toBe('text/event-stream; charset=utf-8');
  opened[0]!.send('import', { state: 'done' });
  streams.closeAll();
  expect(await answer.text()).toBe(
    'event: import\ndata: {"state":"running"}\n\nevent: import\ndata: {"state":"done"}\n\n',
  );
  expect(onEnd).toHaveBeenCalledTimes(1);
});

it('ends once when the reader goes away, and then takes no more events', async () => {
  const answer = await open();
  await answer.body?.cancel();
  await vi.waitFor(() => {
    expect(onEnd).toHaveBeenCalledTimes(1);
  });
  opened[0]!.send('import', {});
  opened[0]!.end();
  streams.closeAll();
  expect(onEnd).toHaveBeenCalledTimes(1);
});
