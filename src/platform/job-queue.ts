export interface QueuedJob {
  name: string;
  /** What makes it unique for ever: job, squad and period joined by `|`. */
  key: string;
  data: object;
  clubId: string;
}

/** Work to be done once, later, by a worker process (port and DI token). */
export abstract class JobQueue {
  /**
   * Joins the transaction of the unit of work under way. False if a job with this name and key waits, runs or is done;
   * one that failed for good is queued again.
   */
  abstract enqueueOnce(job: QueuedJob): Promise<boolean>;
}
