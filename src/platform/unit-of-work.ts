/** For whom a unit of work reads and writes: row-level security sees exactly this. */
export interface WorkScope {
  clubId: string;
  /** The person asking; null for the service itself (jobs). */
  personId: string | null;
}

/**
 * One transaction per request and per job (port and DI token). Repositories only know the transaction under way and
 * throw without one.
 */
export abstract class UnitOfWork {
  /**
   * Runs `work` in one transaction that sees one club's rows. A nested call for the same club joins the transaction
   * under way, and may name the person of one that runs for nobody yet; one for another club, or for a person other
   * than the one it runs for, is refused.
   */
  abstract run<T>(scope: WorkScope, work: () => Promise<T>): Promise<T>;

  /**
   * Runs `work` as the operator of the installation, who may list and create clubs and sees nothing inside them.
   * `run` inside joins the same transaction with that club in view until its work ends.
   */
  abstract runAsOperator<T>(work: () => Promise<T>): Promise<T>;
}
