export interface MailAttachment {
  filename: string;
  content: Buffer;
  contentType: string;
}

/** A mail that is complete: identifier and date are given, so that the same mail is the same bytes of header. */
export interface OutgoingMail {
  /** With angle brackets or without; sent with them. */
  messageId: string;
  from: string;
  to: string[];
  subject: string;
  text: string;
  html: string;
  attachments: MailAttachment[];
  date: Date;
}

export interface MailReceipt {
  accepted: boolean;
  /** The server's last answer, or where the mail was put. */
  detail: string;
}

/** Hands a finished mail over (port and DI token). A refusal is an answer; not reaching the server is an error. */
export abstract class MailTransport {
  abstract send(message: OutgoingMail): Promise<MailReceipt>;
}
