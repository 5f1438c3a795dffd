/** What has to hold before requests are taken. */
export interface ReadinessState {
  /** The database answers. */
  database: boolean;
  /** Every table this version needs is there. */
  schema: boolean;
}

/** Whether the service could do its work right now (port and DI token). */
export abstract class Readiness {
  abstract check(): Promise<ReadinessState>;
}
