import type { AvailabilityState } from '../days/days.types.ts';
import type { Modality } from '../thresholds/thresholds.types.ts';

export const causes = ['illness', 'injury', 'complaint', 'away', 'other'] as const;
export type Cause = (typeof causes)[number];

/** Whether and how an athlete can train, for a stretch of days. */
export interface Availability {
  id: string;
  athleteId: string;
  state: AvailabilityState;
  cause: Cause;
  allowedModalities: Modality[];
  /** In own words; the athlete's and the medic's. */
  reason: string | null;
  from: string;
  to: string | null;
  enteredBy: string | null;
  enteredAt: Date;
}
