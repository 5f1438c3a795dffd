export interface QueuedJob {
  name: string;
  /** What makes it unique for ever: job, squad and period joined by `|`. */
  key: string;
  data: object;
  clubId: string;
}

/** Work to be done once, later, by a worker process (port and DI token). */
export abstract class JobQueue {
  /** Joins the transaction of the unit of work under way; false if a job with this name and key was ever queued. */
  abstract enqueueOnce(job: QueuedJob): Promise<boolean>;
}
