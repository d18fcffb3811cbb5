import { html } from '../http/html';

/** An e-mail before it is laid out: plain sentences, and at most one thing to do. */
export interface Letter {
  readonly to: string;
  readonly subject: string;
  readonly paragraphs: readonly string[];
  readonly action: { readonly label: string; readonly url: string };
  /** What to know when the e-mail was not expected. */
  readonly closing: string;
}

export interface LaidOutMail {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}

// Colours and sizes of the product's day theme. Mail programs read only style attributes.
const PAPER = 'margin:0;padding:24px 16px;background:#f7f2e7;color:#221f19';
const FACE = "font:16px/24px 'Atkinson Hyperlegible Next',Verdana,sans-serif";
const SHEET = `max-width:520px;margin:0 auto;padding:0 0 24px;${FACE}`;
const MARK = 'margin:0 0 24px;padding:0 0 9px;border-bottom:3px solid #221f19;font-weight:bold';
const SENTENCE = 'margin:0 0 16px;font-size:24px;line-height:32px;font-weight:normal';
const PARAGRAPH = 'margin:0 0 16px';
const BUTTON =
  'display:inline-block;padding:10px 16px;border-radius:3px;background:#221f19;color:#f7f2e7;text-decoration:none';
const SMALL = 'margin:24px 0 0;font-size:14px;line-height:20px;color:#5b5446';

/** Both forms of an e-mail: the text says everything that the HTML says; no image is fetched. */
export function layOutMail(letter: Letter): LaidOutMail {
  const { subject, paragraphs, action, closing } = letter;
  const text = [
    subject,
    ...paragraphs,
    `${action.label}:\n${action.url}`,
    closing,
    '--\nStillpier',
  ];
  const page = html`<!doctype html>
    <html lang="en">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width,initial-scale=1" />
        <meta name="color-scheme" content="light" />
        <title>${subject}</title>
      </head>
      <body style="${PAPER}">
        <div style="${SHEET}">
          <p style="${MARK}">Stillpier</p>
          <h1 style="${SENTENCE}">${subject}</h1>
          ${paragraphs.map((paragraph) => html`<p style="${PARAGRAPH}">${paragraph}</p>`)}
          <p style="${PARAGRAPH}"><a href="${action.url}" style="${BUTTON}">${action.label}</a></p>
          <p style="${SMALL}">
            Or open this address: <span style="word-break:break-all">${action.url}</span>
          </p>
          <p style="${SMALL}">${closing}</p>
        </div>
      </body>
    </html>`;
  return { subject: `${subject} · Stillpier`, text: text.join('\n\n'), html: page.text };
}
