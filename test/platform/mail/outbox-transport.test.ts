import { mkdtempSync, readdirSync, readFileSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from '@jest/globals';
import { simpleParser } from 'mailparser';
import { createMailTransport } from '../../../src/platform/mail/create-mail-transport.ts';
import { outboxFileName, OutboxTransport } from '../../../src/platform/mail/outbox-transport.ts';
import { SmtpTransport } from '../../../src/platform/mail/smtp-transport.ts';
import { testMail } from './mails.ts';

let folder: string;
let outbox: OutboxTransport;

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'outbox-'));
  outbox = new OutboxTransport(join(folder, 'made', 'when needed'));
});

afterEach(() => rmSync(folder, { recursive: true }));

test('writes a mail that reads back as it was', async () => {
  const mail = testMail({ to: ['coach@example.org', 'Second Coach <second@example.org>'] });
  const { accepted, detail } = await outbox.send(mail);
  expect(accepted).toBe(true);
  const bytes = readFileSync(detail);
  const read = await simpleParser(bytes);
  expect(read.messageId).toBe(mail.messageId);
  expect(read.date).toEqual(mail.date);
  expect(read.subject).toBe(mail.subject);
  expect(read.from?.text).toBe('"Loadweir" <loadweir@example.org>');
  expect([read.to].flat().map((to) => to?.text)).toEqual(['coach@example.org, "Second Coach" <second@example.org>']);
  expect(read.text?.trim()).toBe(mail.text.trim());
  expect(read.html).toContain('<b>talk</b>');
  expect(read.attachments).toHaveLength(1);
  expect(read.attachments[0]).toMatchObject({
    filename: mail.attachments[0]?.filename,
    contentType: mail.attachments[0]?.contentType,
    content: mail.attachments[0]?.content,
  });
  const lines = bytes.toString('latin1').split('\r\n');
  expect(lines.join('')).not.toMatch(/[\r\n]/);
  expect(Math.max(...lines.map(({ length }) => length))).toBeLessThanOrEqual(998);
});

test('the same mail is the same bytes, whoever writes it', async () => {
  const other = new OutboxTransport(join(folder, 'other'));
  const [here, there] = [await outbox.send(testMail()), await other.send(testMail())];
  expect(readFileSync(here.detail).equals(readFileSync(there.detail))).toBe(true);
});

test('a mail that is there already is not written again', async () => {
  const first = await outbox.send(testMail());
  writeFileSync(first.detail, 'kept');
  const again = await outbox.send(testMail({ subject: 'another' }));
  expect(again).toEqual(first);
  expect(readFileSync(first.detail, 'utf8')).toBe('kept');
});

test('ten senders of one mail leave one whole file, for its owner only, and nothing unfinished', async () => {
  const receipts = await Promise.all(Array.from({ length: 10 }, () => outbox.send(testMail())));
  const target = receipts[0]?.detail ?? '';
  expect(new Set(receipts.map(({ detail }) => detail)).size).toBe(1);
  expect(readdirSync(join(folder, 'made', 'when needed'))).toEqual([outboxFileName(testMail().messageId)]);
  expect(statSync(target).mode & 0o777).toBe(0o600);
  expect((await simpleParser(readFileSync(target))).attachments).toHaveLength(1);
});

test('file names are readable, safe and different for different messages', () => {
  expect(outboxFileName('<weekly|squad-1|2026-W10@loadweir.example>')).toMatch(
    /^weekly-squad-1-2026-W10-[0-9a-f]{16}\.eml$/,
  );
  expect(outboxFileName('<a@x>')).toBe(outboxFileName('a@x'));
  expect(outboxFileName('<a@x>')).not.toBe(outboxFileName('<a@y>'));
  expect(outboxFileName('<../../etc/passwd@x>')).toMatch(/^etc-passwd-[0-9a-f]{16}\.eml$/);
});

test('a line break in a subject or an address makes no new header', async () => {
  const { detail } = await outbox.send(testMail({ subject: 'One\r\nBcc: eve@example.org' }));
  const read = await simpleParser(readFileSync(detail));
  expect(read.bcc).toBeUndefined();
  expect(read.subject).toContain('One');
});

test('a folder that cannot be written is an error, not a receipt', async () => {
  writeFileSync(join(folder, 'file'), '');
  await expect(new OutboxTransport(join(folder, 'file')).send(testMail())).rejects.toThrow(/EEXIST|ENOTDIR/);
});

test('a named mail server wins over the outbox', () => {
  expect(createMailTransport({ SMTP_URL: undefined, OUTBOX_DIR: folder })).toBeInstanceOf(OutboxTransport);
  expect(createMailTransport({ SMTP_URL: 'smtp://127.0.0.1', OUTBOX_DIR: folder })).toBeInstanceOf(SmtpTransport);
});
