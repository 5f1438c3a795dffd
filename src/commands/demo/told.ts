import type { MadeReport } from '../../demo/weekly-report.ts';
import type { Summary } from '../../demo/summary.ts';

/** What a person reads on the terminal: who is flagged and why, and where to look on. */
export function told(summary: Summary, made: MadeReport, seconds: { logging: number }): string[] {
  const { counts } = summary;
  const mails = made.deliveries.map(({ email, state, sentAt }) =>
    made.fresh ? `  to ${email}: ${state}` : `  to ${email}: already sent (${sentAt ?? state})`,
  );
  return [
    '',
    `${summary.club} · ${summary.squad} · ${summary.isoWeek}`,
    `${counts.athleteSessions} sessions of ${counts.athletes} athletes over 12 weeks, ` +
      `${made.fresh ? 'logged' : 'looked through'} over HTTP in ${seconds.logging.toFixed(1)} s; ${counts.closedDays} of ${counts.days} days closed.`,
    '',
    summary.headline,
    ...flagged(summary),
    '',
    `Monday report, version ${made.report.version}:`,
    ...mails,
    ...summary.files.map((file) => `  ${file}`),
    '',
  ];
}

const LEVELS = ['act', 'watch', 'note'];

function flagged({ athletes }: Summary): string[] {
  const rows = athletes.flatMap(({ name, flags }) =>
    flags.map(({ level, kind, since, sentence }) => ({ name, level, kind, since, sentence })),
  );
  if (rows.length === 0) return ['Nobody is flagged.'];
  rows.sort((a, b) => LEVELS.indexOf(a.level) - LEVELS.indexOf(b.level));
  const width = Math.max(...rows.map(({ name }) => name.length));
  return rows.map(
    ({ name, level, kind, since, sentence }) =>
      `  ${level.padEnd(5)} ${name.padEnd(width)}  ${kind} since ${since}: ${sentence}`,
  );
}
