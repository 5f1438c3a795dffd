import type { AddressInfo } from 'node:net';
import { SMTPServer } from 'smtp-server';

export interface ReceivedMail {
  to: string[];
  messageId: string;
  subject: string;
  raw: string;
}

export interface MailServer {
  url: string;
  /** Mails it said yes to, in that order. */
  accepted: ReceivedMail[];
  /** Number of mails it was given, accepted or not. */
  offered(): number;
  /** From now on its yes waits until `release`. */
  hold(): void;
  release(): void;
  close(): Promise<void>;
}

/** A real SMTP server on a free port. */
export async function startMailServer(): Promise<MailServer> {
  const accepted: ReceivedMail[] = [];
  let offered = 0;
  let held = Promise.resolve();
  let release: () => void = () => undefined;
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['AUTH', 'STARTTLS'],
    onData(stream, session, callback) {
      const parts: Buffer[] = [];
      stream.on('data', (part: Buffer) => parts.push(part));
      stream.on('end', () => {
        offered += 1;
        const to = session.envelope.rcptTo.map(({ address }) => address);
        void held.then(() => {
          // The sender may be gone by now: then its mail was never taken.
          if (!connected.has(session.id)) return callback(new Error('gone'));
          accepted.push(received(to, Buffer.concat(parts).toString()));
          callback();
        });
      });
    },
    onConnect(session, callback) {
      connected.add(session.id);
      callback();
    },
    onClose(session) {
      connected.delete(session.id);
    },
  });
  const connected = new Set<string>();
  server.on('error', () => undefined);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const { port } = server.server.address() as AddressInfo;
  return {
    url: `smtp://127.0.0.1:${port}`,
    accepted,
    offered: () => offered,
    hold: () => {
      held = new Promise((resolve) => (release = resolve));
    },
    release: () => release(),
    close: () => new Promise((resolve) => server.close(resolve)),
  };
}

/** Header lines may be folded: a line that begins with white space goes on with the one before. */
function received(to: string[], raw: string): ReceivedMail {
  const head = raw.split('\r\n\r\n', 1)[0]!.replace(/\r\n[ \t]+/g, ' ');
  const header = (name: string) => new RegExp(`^${name}: *(.*)$`, 'im').exec(head)?.[1]?.trim() ?? '';
  return { to, messageId: header('Message-ID'), subject: header('Subject'), raw };
}
