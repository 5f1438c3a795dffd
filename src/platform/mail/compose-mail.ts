import { createHash } from 'node:crypto';
import { createTransport } from 'nodemailer';
import type { OutgoingMail } from './mail-transport.ts';

const composer = createTransport({ streamTransport: true, buffer: true, newline: 'windows' });

/** The mail as RFC 5322 wants it; the same mail gives the same bytes, also its inner boundaries. */
export async function composeMail(mail: OutgoingMail): Promise<Buffer> {
  const { message } = await composer.sendMail({
    ...mail,
    messageId: bracketed(mail.messageId),
    baseBoundary: fingerprint(mail.messageId),
    disableFileAccess: true,
    disableUrlAccess: true,
  });
  return message as Buffer;
}

export function bracketed(messageId: string): string {
  return `<${messageId.replace(/^<|>$/g, '')}>`;
}

/** Sixteen characters that stand for a message identifier. */
export function fingerprint(messageId: string): string {
  return createHash('sha256').update(bracketed(messageId)).digest('hex').slice(0, 16);
}
