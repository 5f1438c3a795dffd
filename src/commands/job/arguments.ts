import { parseArgs } from 'node:util';
import { jobIds, jobKinds } from '../../features/jobs/jobs.types.ts';
import type { JobId } from '../../features/jobs/jobs.types.ts';
import { periodDays } from '../../features/jobs/job-period.ts';
import { UsageError } from '../support/usage-error.ts';

export interface JobArguments {
  job: JobId;
  squad: string;
  club: string | undefined;
  /** Undefined: the one the schedule would take now. */
  period: string | undefined;
  dryRun: boolean;
}

/** Null: help was asked for. @throws {UsageError} */
export function jobArguments(args: readonly string[]): JobArguments | null {
  const { values, positionals } = parsed(args);
  if (values.help === true || args.length === 0) return null;
  const job = positionals[0];
  if (!isJob(job)) throw new UsageError(`no job "${job ?? ''}"; there are: ${jobIds.join(', ')}`);
  if (positionals.length > 1) throw new UsageError(`unexpected "${positionals[1]}": name one job`);
  if (values.squad === undefined) throw new UsageError('--squad is missing: the name or id of a squad');
  const { period: kind } = jobKinds[job];
  const [fitting, other] = kind === 'iso-week' ? (['week', 'day'] as const) : (['day', 'week'] as const);
  if (values[other] !== undefined) throw new UsageError(`the job ${job} takes --${fitting}, not --${other}`);
  const period = values[fitting];
  if (period !== undefined && periodDays(kind, period) === null) {
    const example = kind === 'iso-week' ? 'an ISO week like 2026-W48' : 'a date like 2026-11-23';
    throw new UsageError(`--${fitting} ${period}: ${example} is needed, and it has to exist`);
  }
  return { job, squad: values.squad, club: values.club, period, dryRun: values['dry-run'] === true };
}

function parsed(args: readonly string[]) {
  try {
    return parseArgs({
      args: [...args],
      allowPositionals: true,
      options: {
        squad: { type: 'string' },
        club: { type: 'string' },
        week: { type: 'string' },
        day: { type: 'string' },
        'dry-run': { type: 'boolean' },
        help: { type: 'boolean' },
      },
    });
  } catch (error) {
    throw new UsageError((error as Error).message);
  }
}

function isJob(text: string | undefined): text is JobId {
  return jobIds.some((id) => id === text);
}
