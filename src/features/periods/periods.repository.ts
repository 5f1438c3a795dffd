import type { LoadPeriod } from './periods.types.ts';

/** Planned load periods (port and DI token). */
export abstract class PeriodsRepository {
  abstract insert(period: LoadPeriod): Promise<void>;
  /** Of the squad and its athletes, by first day. */
  abstract list(squadId: string): Promise<LoadPeriod[]>;
}
