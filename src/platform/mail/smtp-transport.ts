import { createTransport } from 'nodemailer';
import { UnavailableError } from '../errors.ts';
import { composeMail } from './compose-mail.ts';
import { MailTransport } from './mail-transport.ts';
import type { MailReceipt, OutgoingMail } from './mail-transport.ts';

interface SmtpAnswer {
  response: string;
  rejected: unknown[];
}

interface SmtpFailure extends Error {
  code?: string;
  /** The command the server answered. */
  command?: string;
  responseCode?: number;
  response?: string;
}

const patience = { connectionTimeout: 10_000, greetingTimeout: 10_000, socketTimeout: 60_000 };

/** Hands mails to the server named in SMTP_URL, one connection a mail. */
export class SmtpTransport extends MailTransport {
  readonly #url: string;

  constructor(smtpUrl: string) {
    super();
    this.#url = withDefaults(smtpUrl);
  }

  /**
   * A recipient or message refused for good (5xx) is a receipt that says so. Everything else is thrown and may be tried again, except code
   * `mail-outcome-unknown`: the connection was lost after the mail had gone out and before the server's word on it.
   */
  async send(mail: OutgoingMail): Promise<MailReceipt> {
    const raw = await composeMail(mail);
    const progress = { goneOut: false };
    const transport = createTransport({ url: this.#url, logger: watching(progress) });
    try {
      const envelope = { from: mail.from, to: mail.to };
      const sent = (await transport.sendMail({ envelope, raw })) as SmtpAnswer;
      const refused = sent.rejected.length;
      const note = refused === 0 ? '' : ` (refused for ${refused} of ${mail.to.length} recipients)`;
      return { accepted: true, detail: `${sent.response}${note}` };
    } catch (error) {
      const { code, command, responseCode = 0, response } = error as SmtpFailure;
      // What is answered to MAIL FROM (sign in first, not this sender) is put right at the server or in the settings.
      const aboutTheMail = (code === 'EENVELOPE' && command !== 'MAIL FROM') || code === 'EMESSAGE';
      if (aboutTheMail && responseCode >= 500) return { accepted: false, detail: response ?? String(responseCode) };
      throw new UnavailableError('The mail server did not take the mail.', {
        code: progress.goneOut && responseCode === 0 ? 'mail-outcome-unknown' : 'mail-not-sent',
        cause: error,
      });
    } finally {
      transport.close();
    }
  }
}

/** The URL's own parameters win; a password does not go over a network in the clear. */
export function withDefaults(smtpUrl: string): string {
  const url = new URL(smtpUrl);
  const nearby = ['localhost', '127.0.0.1', '[::1]'].includes(url.hostname);
  const defaults = { ...patience, ...(url.username !== '' && !nearby ? { requireTLS: true } : {}) };
  for (const [name, value] of Object.entries(defaults)) {
    if (!url.searchParams.has(name)) url.searchParams.set(name, String(value));
  }
  return url.href;
}

/** The library says only in its log when the last byte of the mail has been handed to the connection. */
function watching(progress: { goneOut: boolean }) {
  const ignore = () => undefined;
  const info = (entry: unknown) => {
    if ((entry as { tnx?: unknown } | undefined)?.tnx === 'message') progress.goneOut = true;
  };
  return { level: ignore, trace: ignore, debug: ignore, info, warn: ignore, error: ignore, fatal: ignore };
}
