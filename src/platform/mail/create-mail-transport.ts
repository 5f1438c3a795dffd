import type { Env } from '../env.ts';
import type { MailTransport } from './mail-transport.ts';
import { OutboxTransport } from './outbox-transport.ts';
import { SmtpTransport } from './smtp-transport.ts';

/** The mail server where one is named, the outbox folder otherwise. */
export function createMailTransport(env: Pick<Env, 'SMTP_URL' | 'OUTBOX_DIR'>): MailTransport {
  return env.SMTP_URL === undefined ? new OutboxTransport(env.OUTBOX_DIR) : new SmtpTransport(env.SMTP_URL);
}
