import express from 'express';
import { pino } from 'pino';
import request from 'supertest';
import { expect, it } from 'vitest';
import { errorHandler } from './error-handler';
import { requireVersion, versionTag } from './version-tag';

const app = express();
app.put('/', (req, res) => {
  res.json({ version: requireVersion(req) });
});
app.use(errorHandler(pino({ level: 'silent' })));

it.each([versionTag(7), `W/${versionTag(7)}`])('reads the version in %s', async (ifMatch) => {
  const answer = await request(app).put('/').set('If-Match', ifMatch).expect(200);
  expect(answer.body).toEqual({ version: 7 });
});

it('asks for the version when it is missing', async () => {
  await request(app).put('/').expect(428);
});

it.each(['7', '*', '"a"', '"7", "8"', ''])('refuses %s', async (ifMatch) => {
  await request(app).put('/').set('If-Match', ifMatch).expect(400);
});
