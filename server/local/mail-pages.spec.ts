import { mkdtempSync, readdirSync, rmSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import request from 'supertest';
import { afterEach, beforeEach, expect, it } from 'vitest';
import { mailPages } from './mail-pages';
import { MailStore } from './mail-store';

let folder: string;
let store: MailStore;
beforeEach(async () => {
  folder = mkdtempSync(path.join(os.tmpdir(), 'stillpier-mails-'));
  store = await MailStore.open(folder);
});
afterEach(() => {
  rmSync(folder, { recursive: true });
});

const mailOf = (subject: string, text: string, html = '<p>the same</p>') =>
  Buffer.from(
    [
      'From: Stillpier <no-reply@stillpier.test>',
      'To: ada@stillpier.test',
      `Subject: ${subject}`,
      'Content-Type: multipart/alternative; boundary="part"',
      '',
      '--part\r\nContent-Type: text/plain; charset=utf-8\r\n',
      text,
      '--part\r\nContent-Type: text/html; charset=utf-8\r\n',
      html,
      '--part--',
    ].join('\r\n'),
  );
const page = (url: string) => request(mailPages(store)).get(url);

it('lists mails, newest first, and says so when there are none', async () => {
  expect((await page('/')).text).toContain('No mail was sent yet');
  await store.add(mailOf('First', 'a'));
  await store.add(mailOf('Second', 'b'));
  const { text } = await page('/');
  expect(text.indexOf('Second')).toBeGreaterThan(-1);
  expect(text.indexOf('Second')).toBeLessThan(text.indexOf('First'));
});

it('shows a mail with its addresses as links, and nothing of it as markup', async () => {
  const link = 'http://127.0.0.1:3000/confirm#token=abc';
  await store.add(mailOf('<b>Hello</b>', `Open <i>this</i>:\r\n${link}`, '<p title="x">"&</p>'));
  const answer = await page(`/mails/${store.mails[0]!.id}`).expect(200);
  expect(answer.text).toContain(`<a href="${link}">${link}</a>`);
  expect(answer.text).toContain('&lt;i&gt;this&lt;/i&gt;');
  expect(answer.text).toContain('&lt;b&gt;Hello&lt;/b&gt;');
  expect(answer.text).not.toContain('<p title="x">');
  expect(answer.headers['content-security-policy']).toContain("default-src 'none'");
});

it('is not shown under a foreign host name', async () => {
  await page('/').set('Host', 'elsewhere.test').expect(403);
});

it('answers 404 for a mail that is not kept, and for paths out of the folder', async () => {
  await page('/mails/none').expect(404);
  await page('/mails/..%2F..%2Fetc%2Fpasswd').expect(404);
});

it('keeps 200 mails, as files too, and finds them again after a restart', async () => {
  for (let count = 0; count < 203; count++) await store.add(mailOf(`Mail ${count}`, 'text'));
  expect(readdirSync(folder)).toHaveLength(200);
  const reopened = await MailStore.open(folder);
  expect(reopened.mails).toHaveLength(200);
  expect(reopened.mails.map(({ subject }) => subject)).toEqual(
    store.mails.map(({ subject }) => subject),
  );
  expect(reopened.mails[0]?.subject).toBe('Mail 202');
});
