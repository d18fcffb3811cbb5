import express, { type Express } from 'express';
import { html, Markup } from '../http/html';
import type { KeptMail, MailStore } from './mail-store';

// The frame of a mail inherits this: nothing is fetched, and no script runs, whatever is in it.
const POLICY = "default-src 'none'; style-src 'unsafe-inline'; img-src data:; form-action 'none'";
const LOOPBACK_NAMES = new Set(['127.0.0.1', 'localhost', '::1', '[::1]']);
const STYLE = `
  :root { color-scheme: light dark; --paper: light-dark(#f7f2e7, #1b2129); --ink: light-dark(#221f19, #ece7da);
    --quiet: light-dark(#5b5446, #b1b2ac); --rule: light-dark(#dcd3bf, #343d48); --mark: light-dark(#7a2f47, #dfa0b6) }
  body { margin: 0 auto; max-width: 920px; padding: 24px 16px 72px; background: var(--paper); color: var(--ink);
    font: 16px/24px 'Atkinson Hyperlegible Next', Verdana, sans-serif }
  header { border-bottom: 3px solid } h1 { font-size: 25px; line-height: 32px; font-weight: 430 } a { color: var(--mark) }
  table { width: 100%; border-collapse: collapse } th { text-align: left; color: var(--quiet); font-weight: 400 }
  th, td { padding: 4px 12px 4px 0; border-bottom: 1px solid var(--rule); vertical-align: top; overflow-wrap: anywhere }
  pre { white-space: pre-wrap; overflow-wrap: anywhere; font: inherit } h2 { margin: 40px 0 0; padding-top: 9px; border-top: 1px solid; font-size: 20px }
  iframe { width: 100%; height: 560px; margin-top: 16px; border: 1px solid var(--rule); background: #f7f2e7 }`;

/** The pages that show what the mail catcher keeps. */
export function mailPages(store: MailStore): Express {
  const app = express();
  app.disable('x-powered-by');
  app.use((req, res, next) => {
    // A page elsewhere whose name was pointed at this machine must not read the mails.
    if (LOOPBACK_NAMES.has(req.hostname)) next();
    else res.status(403).type('text').send('The mails are shown on this machine only.');
  });
  app.use((_req, res, next) => {
    res.set({
      'Content-Security-Policy': POLICY,
      'X-Content-Type-Options': 'nosniff',
      'Referrer-Policy': 'no-referrer',
      'Cache-Control': 'no-store',
    });
    next();
  });
  app.get('/', (_req, res) => {
    res.type('html').send(writeList(store.mails));
  });
  app.get('/mails/:id', (req, res) => {
    const mail = store.find(req.params.id);
    if (mail) res.type('html').send(writeMail(mail));
    else res.status(404).type('text').send('This mail is not kept any more.');
  });
  return app;
}

function writeList(mails: readonly KeptMail[]): string {
  const rows = mails.map(
    (mail) =>
      html`<tr>
        <td>${timeOf(mail)}</td>
        <td>${mail.to}</td>
        <td><a href="/mails/${mail.id}">${mail.subject}</a></td>
      </tr>`,
  );
  const sentence =
    rows.length === 0
      ? 'No mail was sent yet. Load this page again once one should be here.'
      : 'Mails that this installation sent. None has left this machine.';
  return writePage(
    'Mails',
    html`<p>${sentence}</p>
      <table>
        <tr>
          <th>Sent</th>
          <th>To</th>
          <th>Subject</th>
        </tr>
        ${rows}
      </table>`,
  );
}

function writeMail(mail: KeptMail): string {
  // Links open beside this page: the frame may open windows and do nothing else.
  const framed = `<base target="_blank">${mail.html ?? ''}`;
  const frame = html`<h2>As HTML</h2>
    <iframe
      title="The mail as HTML"
      sandbox="allow-popups allow-popups-to-escape-sandbox"
      srcdoc="${framed}"
    ></iframe>`;
  return writePage(
    mail.subject,
    html`<p>To ${mail.to}, ${timeOf(mail)}. <a href="/">All mails</a></p>
      <h2>As text</h2>
      <pre>${withLinks(mail.text)}</pre>
      ${mail.html === null ? '' : frame}`,
  );
}

function writePage(title: string, content: Markup): string {
  return html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width,initial-scale=1" />
        <title>${title} · Stillpier mails</title>
        <style>
          ${new Markup(STYLE)}
        </style>
      </head>
      <body>
        <header><h1>${title}</h1></header>
        <main>${content}</main>
      </body>
    </html>`.text;
}

function timeOf({ receivedAt }: KeptMail): string {
  return receivedAt.toISOString().replace('T', ' ').slice(0, 19) + ' UTC';
}

/** Text with its web addresses as links; a capturing split puts them at the odd places. */
function withLinks(text: string): Markup[] {
  return text
    .split(/(https?:\/\/[^\s<>"]+)/)
    .map((part, index) => (index % 2 === 1 ? html`<a href="${part}">${part}</a>` : html`${part}`));
}
