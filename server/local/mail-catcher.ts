import { buffer } from 'node:stream/consumers';
import type { AddressInfo, Server } from 'node:net';
import { SMTPServer } from 'smtp-server';
import * as z from 'zod';
import { onStop } from '../lifecycle';
import { mailPages } from './mail-pages';
import { MailStore } from './mail-store';

const LOOPBACK = '127.0.0.1';
const MAX_MAIL_BYTES = 10 * 1024 * 1024;

const { MAIL_FOLDER, MAIL_SMTP_PORT, MAIL_PAGE_PORT } = z
  .object({
    MAIL_FOLDER: z.string().min(1),
    MAIL_SMTP_PORT: z.coerce.number().int(),
    MAIL_PAGE_PORT: z.coerce.number().int(),
  })
  .parse(process.env);

const store = await MailStore.open(MAIL_FOLDER);
const smtp = new SMTPServer({
  authOptional: true,
  disabledCommands: ['AUTH', 'STARTTLS'],
  size: MAX_MAIL_BYTES,
  onData(stream, _session, done) {
    buffer(stream)
      .then((raw) => store.add(raw))
      .then(() => {
        done();
      }, done);
  },
});
smtp.on('error', (error) => {
  console.error('A mail could not be taken.', error.message);
});
const pages = mailPages(store).listen(MAIL_PAGE_PORT, LOOPBACK);
await Promise.all([listening(pages), listening(smtp.listen(MAIL_SMTP_PORT, LOOPBACK))]);
process.send?.({ ready: true, smtpPort: portOf(smtp.server), pagePort: portOf(pages) });

onStop(async () => {
  pages.closeAllConnections();
  await Promise.all([
    new Promise((resolve) => pages.close(resolve)),
    new Promise<void>((resolve) => {
      smtp.close(resolve);
    }),
  ]);
});

function listening(server: Server): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('listening', resolve);
    server.once('error', reject);
  });
}

function portOf(server: { address(): AddressInfo | string | null }): number {
  const address = server.address();
  if (address === null || typeof address === 'string') throw new Error('The server has no port.');
  return address.port;
}
