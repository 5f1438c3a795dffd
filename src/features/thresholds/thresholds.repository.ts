import type { ThresholdValue } from './thresholds.types.ts';

/** Dated threshold values (port and DI token). */
export abstract class ThresholdsRepository {
  /** Every value of these athletes, withdrawn ones too, by quantity and first day. */
  abstract list(athleteIds: readonly string[]): Promise<ThresholdValue[]>;

  /**
   * Nobody else changes these athletes' thresholds, and no session of theirs is weighed, until the unit of work ends.
   * Waits for those under way.
   */
  abstract lockForChange(athleteId: string): Promise<void>;

  /**
   * Stores what differs between the two states of one athlete's values: new values are inserted, changed last days and
   * withdrawals are updated. Order does not matter: that no two overlap is checked at the end.
   */
  abstract save(before: readonly ThresholdValue[], after: readonly ThresholdValue[]): Promise<void>;
}
