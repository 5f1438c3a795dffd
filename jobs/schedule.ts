import type { JobId, JobKind } from '../src/features/jobs/jobs.types.ts';
import { jobKinds } from '../src/features/jobs/jobs.types.ts';

/** A local wall time of the squad, every day or on one weekday (Monday 1 to Sunday 7). */
export interface WallTime {
  weekday?: 1 | 2 | 3 | 4 | 5 | 6 | 7;
  time: string;
}

export interface ScheduledJob extends JobKind {
  id: JobId;
  description: string;
  when: WallTime;
  /** After an outage it is still run until this many hours after its time; later it is left out. */
  catchUpHours: number;
}

/** All that runs by itself, and when. Own conventions: times and catch-up hours. */
export const schedule: readonly ScheduledJob[] = [
  {
    id: 'weekly-report',
    description: 'makes the report of the ISO week that ended and mails it to the coaches of the squad',
    when: { weekday: 1, time: '06:00' },
    ...jobKinds['weekly-report'],
    catchUpHours: 72,
  },
  {
    id: 'log-reminder',
    description: 'tells the staff of the squad which days of the week are not closed yet',
    when: { weekday: 7, time: '18:00' },
    ...jobKinds['log-reminder'],
    catchUpHours: 6,
  },
  {
    id: 'nightly-flags',
    description: 'brings the flags of the squad up to the day that ended',
    when: { time: '02:30' },
    ...jobKinds['nightly-flags'],
    catchUpHours: 20,
  },
];
