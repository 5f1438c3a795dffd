/** A squad's week with days that are not closed yet. */
export interface OpenDays {
  squad: string;
  isoWeek: string;
  /** In order; the last may be today. */
  days: readonly string[];
  today: string;
}

/** The reminder in words: subject, plain text and the same as HTML. */
export function logReminderMail({ squad, isoWeek, days, today }: OpenDays): {
  subject: string;
  text: string;
  html: string;
} {
  const count = days.length === 1 ? '1 day' : `${days.length} days`;
  const is = days.length === 1 ? 'is' : 'are';
  const lines = days.map(
    (day) => `${weekdays[new Date(`${day}T00:00:00Z`).getUTCDay()]} ${day}${day === today ? ' (today)' : ''}`,
  );
  const intro = `${count} of week ${isoWeek} ${is} not closed yet for ${squad}:`;
  const outro =
    'An open day counts as unknown, not as rest, so the Monday report leaves out what rests on it. ' +
    'Closing a day makes a day without a session a rest day, except for athletes named as unknown.';
  return {
    subject: `${squad}: ${count} of week ${isoWeek} ${is} not closed`,
    text: [intro, '', ...lines.map((line) => `- ${line}`), '', outro, ''].join('\n'),
    html: `<p>${escaped(intro)}</p>\n<ul>${lines.map((line) => `<li>${escaped(line)}</li>`).join('')}</ul>\n<p>${escaped(outro)}</p>\n`,
  };
}

const weekdays = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'];

function escaped(text: string): string {
  return text.replace(/[&<>"]/g, (sign) => `&#${sign.charCodeAt(0)};`);
}
