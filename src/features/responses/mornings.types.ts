export const items = ['sleep', 'fatigue', 'stress', 'soreness'] as const;
export type Item = (typeof items)[number];

export const qualities = ['ok', 'question', 'suspect'] as const;
export type Quality = (typeof qualities)[number];

/** What can be answered or measured in a morning; null where it was not. */
export interface MorningValues {
  sleepHours: number | null;
  /** The four ratings and mood: 1 to 7, 7 worse. */
  sleep: number | null;
  fatigue: number | null;
  stress: number | null;
  soreness: number | null;
  mood: number | null;
  restingHeartRateBpm: number | null;
  rmssdMs: number | null;
}

/** One athlete's morning; the night belongs to the morning's date. */
export interface Morning extends MorningValues {
  id: string;
  athleteId: string;
  day: string;
  /** As given, artefacts included; empty where RMSSD was given or not measured. */
  rrIntervalsMs: number[];
  rrRemoved: number | null;
  quality: Quality;
  qualityNotes: string[];
  version: number;
  enteredBy: string | null;
  enteredAt: Date;
  updatedAt: Date;
  withdrawnAt: Date | null;
  withdrawReason: string | null;
}

/** What flags rest on; NaN where it was not measured, or is not to be trusted. */
export interface MorningReadings {
  athleteId: string;
  day: string;
  /** Sum of the four ratings, 4 to 28. */
  sum: number;
  restingHeartRateBpm: number;
  lnRmssd: number;
}

/** A version as it was before a change. */
export interface MorningRevision {
  version: number;
  snapshot: unknown;
  reason: string | null;
  changedBy: string | null;
  changedAt: Date;
}
