// Received letters as files, newest first, so that a second start still shows them.
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { simpleParser } from 'mailparser';

const KEPT_LETTERS = 500;
const LETTER_NAME = /^\d{13}-[0-9a-f]{8}\.eml$/;

export class MailBox {
  constructor(directory) {
    this.directory = directory;
    mkdirSync(directory, { recursive: true });
  }

  /** Keeps the raw letter. Names sort by arrival. */
  add(raw, randomHex) {
    writeFileSync(join(this.directory, `${Date.now()}-${randomHex}.eml`), raw, { mode: 0o600 });
    for (const name of this.names().slice(KEPT_LETTERS)) rmSync(join(this.directory, name), { force: true });
  }

  names() {
    return readdirSync(this.directory)
      .filter((name) => LETTER_NAME.test(name))
      .sort()
      .reverse();
  }

  async list() {
    return Promise.all(this.names().map((name) => this.read(name)));
  }

  /** One letter, or undefined for a name that is none of ours. */
  async read(name) {
    if (!LETTER_NAME.test(name) || !this.names().includes(name)) return undefined;
    const letter = await simpleParser(readFileSync(join(this.directory, name)), { skipHtmlToText: true });
    return {
      id: name,
      messageId: letter.messageId ?? '',
      from: letter.from?.text ?? '',
      to: [letter.to ?? []].flat().map((address) => address.text),
      subject: letter.subject ?? '',
      text: letter.text ?? '',
      receivedAt: new Date(Number(name.slice(0, 13))).toISOString(),
    };
  }
}
