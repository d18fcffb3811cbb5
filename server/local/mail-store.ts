import { mkdir, readdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { simpleParser } from 'mailparser';

const KEPT_MAILS = 200;

export interface KeptMail {
  readonly id: string;
  readonly receivedAt: Date;
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string | null;
}

/** The last mails, each a file as it came in, newest first. */
export class MailStore {
  readonly #mails: KeptMail[] = [];
  #count = 0;

  private constructor(private readonly folder: string) {}

  /** The mails of earlier starts are there again. */
  static async open(folder: string): Promise<MailStore> {
    await mkdir(folder, { recursive: true });
    const store = new MailStore(folder);
    const files = (await readdir(folder)).filter((file) => file.endsWith('.eml')).sort();
    for (const file of files) {
      const id = path.parse(file).name;
      store.#mails.unshift(await parse(id, await readFile(path.join(folder, file))));
    }
    await store.#forgetOldest();
    return store;
  }

  get mails(): readonly KeptMail[] {
    return this.#mails;
  }

  find(id: string): KeptMail | undefined {
    return this.#mails.find((mail) => mail.id === id);
  }

  async add(raw: Buffer): Promise<void> {
    this.#count += 1;
    const order = String(this.#count).padStart(6, '0');
    const id = `${new Date().toISOString().replace(/\D/g, '')}-${process.pid}-${order}`;
    const file = this.#fileOf(id);
    await writeFile(`${file}.part`, raw, { mode: 0o600 });
    await rename(`${file}.part`, file); // half a mail is never read
    this.#mails.unshift(await parse(id, raw));
    await this.#forgetOldest();
  }

  async #forgetOldest(): Promise<void> {
    const forgotten = this.#mails.splice(KEPT_MAILS);
    for (const { id } of forgotten) await rm(this.#fileOf(id), { force: true });
  }

  #fileOf(id: string): string {
    return path.join(this.folder, `${id}.eml`);
  }
}

async function parse(id: string, raw: Buffer): Promise<KeptMail> {
  const { to, subject, text, html, date } = await simpleParser(raw);
  const recipients = [to ?? []].flat().map((address) => address.text);
  return {
    id,
    receivedAt: date ?? new Date(),
    to: recipients.join(', '),
    subject: subject ?? '(no subject)',
    text: text ?? '',
    html: typeof html === 'string' ? html : null,
  };
}
