import { randomUUID } from 'node:crypto';
import { link, mkdir, open, rename, rm } from 'node:fs/promises';
import { join, resolve } from 'node:path';
import { composeMail, fingerprint } from './compose-mail.ts';
import { MailTransport } from './mail-transport.ts';
import type { MailReceipt, OutgoingMail } from './mail-transport.ts';

/** Puts mails into a folder as .eml files, which any mail program opens: where no mail server is named. */
export class OutboxTransport extends MailTransport {
  readonly #folder: string;

  constructor(folder: string) {
    super();
    this.#folder = resolve(folder);
  }

  /** The file appears whole or not at all, and one with this message's name is left as it is. */
  async send(mail: OutgoingMail): Promise<MailReceipt> {
    const target = join(this.#folder, outboxFileName(mail.messageId));
    const unfinished = join(this.#folder, `.${randomUUID()}.tmp`);
    await mkdir(this.#folder, { recursive: true });
    try {
      await writeThrough(unfinished, await composeMail(mail));
      await appear(unfinished, target);
    } finally {
      await rm(unfinished, { force: true });
    }
    await flush(this.#folder);
    return { accepted: true, detail: target };
  }
}

/** Readable, and different for different identifiers. */
export function outboxFileName(messageId: string): string {
  const readable = messageId
    .replace(/^<|@.*$|>$/g, '')
    .replace(/[^A-Za-z0-9-]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 80);
  return `${readable}-${fingerprint(messageId)}.eml`;
}

async function appear(unfinished: string, target: string): Promise<void> {
  try {
    await link(unfinished, target);
  } catch (error) {
    const { code } = error as NodeJS.ErrnoException;
    if (code === 'EEXIST') return;
    // Some file systems know no links: there the last of two senders of one message wins, with the same bytes.
    if (code !== 'EPERM' && code !== 'ENOTSUP' && code !== 'ENOSYS') throw error;
    await rename(unfinished, target);
  }
}

async function writeThrough(file: string, content: Buffer): Promise<void> {
  const handle = await open(file, 'wx', 0o600);
  try {
    await handle.writeFile(content);
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function flush(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
