/** What a job that runs for a squad is about: one run covers one period. */
export interface JobKind {
  period: 'iso-week' | 'day';
  /** Whether it covers the period that ended before it runs, or the one still under way. */
  covers: 'ended' | 'under-way';
}

/** The jobs that run for a squad, one run a period. When they run stands in the schedule of the worker. */
export const jobKinds = {
  'weekly-report': { period: 'iso-week', covers: 'ended' },
  'log-reminder': { period: 'iso-week', covers: 'under-way' },
  'nightly-flags': { period: 'day', covers: 'ended' },
} as const satisfies Record<string, JobKind>;

export type JobId = keyof typeof jobKinds;
export const jobIds = Object.keys(jobKinds) as [JobId, ...JobId[]];

/** One run, unique for ever: a job, a squad and the period it covers. */
export interface JobKey {
  job: JobId;
  squadId: string;
  /** '2026-W48' or '2026-11-23'. */
  period: string;
}

/** Job, squad and period joined by `|`. */
export function keyOf({ job, squadId, period }: JobKey): string {
  return `${job}|${squadId}|${period}`;
}

export type JobRunState = 'queued' | 'running' | 'done' | 'failed';

export interface JobRecord extends JobKey {
  state: JobRunState;
  /** How often it was begun; also names the attempt that may still write. */
  attempts: number;
  progress: JobProgress;
  claimedAt: Date;
  finishedAt: Date | null;
}

/** What a run has done so far, kept with its record so that the next attempt goes on from there. */
export interface JobProgress {
  /** Steps that are done and must not be done again. */
  steps: string[];
  /** What it came to, or why it failed, in one sentence. */
  note?: string;
}

/** A squad as the scheduler sees it. */
export interface ScheduledSquad {
  clubId: string;
  squadId: string;
  name: string;
  zone: string;
  createdAt: Date;
}
