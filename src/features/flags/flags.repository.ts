import type { AthleteFlag, PlannedPeriod, RunEvidence, StoredFlag, ThresholdUse } from './flags.types.ts';

/** Flags on record, and what else they are judged from (port and DI token). */
export abstract class FlagRepository {
  /** All flags of these athletes, newest first. */
  abstract ofAthletes(athleteIds: readonly string[]): Promise<StoredFlag[]>;
  /** Writes flags keyed by athlete, kind and first day; one whose content is the same is not touched. @returns rows written */
  abstract write(flags: readonly AthleteFlag[], asOf: string): Promise<number>;
  abstract runs(athleteIds: readonly string[], until: string): Promise<RunEvidence[]>;
  abstract thresholdUse(athleteIds: readonly string[], until: string): Promise<ThresholdUse[]>;
  abstract periods(squadIds: readonly string[]): Promise<PlannedPeriod[]>;
}
