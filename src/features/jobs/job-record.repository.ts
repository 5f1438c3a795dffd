import type { JobKey, JobProgress, JobRecord, JobRunState, ScheduledSquad } from './jobs.types.ts';

/** What may change on a record. */
export interface JobRecordState {
  state: JobRunState;
  attempts: number;
  progress: JobProgress;
  finishedAt: Date | null;
}

/** Records of what the scheduler and people have started (port and DI token). */
export abstract class JobRecordRepository {
  /** Operator only: the squads of all clubs. */
  abstract squadsOfAllClubs(): Promise<ScheduledSquad[]>;
  /** Operator only: names of all clubs by id. */
  abstract clubNames(): Promise<Map<string, string>>;
  /** Operator only: those of the runs that wait, run or are done; one that failed for good or was abandoned may be claimed again. */
  abstract claimed(runs: readonly JobKey[], now: Date): Promise<JobKey[]>;

  /** False where there is a record already. */
  abstract insert(run: JobKey, claimedAt: Date): Promise<boolean>;
  abstract find(run: JobKey): Promise<JobRecord | null>;
  /** The record, held until the unit of work ends: attempts at one run write one after the other. */
  abstract lock(run: JobKey): Promise<JobRecord | null>;
  abstract save(run: JobKey, state: JobRecordState): Promise<void>;
  /** Newest first. */
  abstract ofSquad(squadId: string, limit: number): Promise<JobRecord[]>;
}
