import type { OutgoingMail } from '../../../src/platform/mail/mail-transport.ts';

/** A mail with everything that is hard to send: letters beyond ASCII, long lines, a leading dot, an attachment. */
export function testMail(change: Partial<OutgoingMail> = {}): OutgoingMail {
  return {
    messageId: '<weekly|squad-1|2026-W10@loadweir.example>',
    from: 'Loadweir <loadweir@example.org>',
    to: ['coach@example.org'],
    subject: 'Rowers, week 10 – who needs a talk',
    text: `Nobody needs a talk.\n.\n${'long '.repeat(300)}\nGrüße`,
    html: '<p>Nobody needs a <b>talk</b>.</p>',
    attachments: [
      {
        filename: 'Bericht Übersicht.xlsx',
        content: Buffer.from([0, 1, 2, 13, 10, 46, 13, 10, 255]),
        contentType: 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
      },
    ],
    date: new Date('2026-03-09T05:00:00Z'),
    ...change,
  };
}
