import type { Modality, Setting } from '../thresholds/thresholds.types.ts';

export const testKinds = ['criterion', 'standard-bout'] as const;
export type TestKind = (typeof testKinds)[number];
export const directions = ['higher', 'lower'] as const;
export type Direction = (typeof directions)[number];
/** A suspect result is kept and stays out of what is expected. */
export const resultQualities = ['ok', 'suspect'] as const;
export type ResultQuality = (typeof resultQualities)[number];

/** What only a criterion test (maximal) has: the unit of its result, which way is better, and its typical error. */
export interface CriterionScale {
  unit: string;
  direction: Direction;
  /** In the unit of the result. */
  typicalError: number;
}

/** A test as a squad does it. */
export interface TestDefinition {
  id: string;
  squadId: string;
  kind: TestKind;
  name: string;
  protocol: string;
  modality: Modality;
  setting: Setting;
  /** Null for a standard bout. */
  scale: CriterionScale | null;
  /** Typical error of the rating at the same work [CR-10 units]; null for a criterion test. */
  ratingTypicalError: number | null;
  /** Typical error of the heart rate at the same work [bpm]; null for a criterion test. */
  heartRateTypicalError: number | null;
  createdBy: string | null;
  createdAt: Date;
  withdrawnAt: Date | null;
  withdrawReason: string | null;
}

/** Of a standard bout: what the fixed work cost. */
export interface BoutReadings {
  workW: number | null;
  workMps: number | null;
  heartRateBpm: number | null;
  /** Fall of the heart rate in the first minute after the bout. */
  heartRateRecoveryBpm: number | null;
  rating: number | null;
  lactateMmolL: number | null;
}

export interface TestResult extends BoutReadings {
  id: string;
  definitionId: string;
  athleteId: string;
  day: string;
  /** Of a criterion test. */
  value: number | null;
  quality: ResultQuality;
  qualityNotes: string[];
  note: string | null;
  enteredBy: string | null;
  enteredAt: Date;
  supersedes: string | null;
  withdrawnAt: Date | null;
  withdrawnBy: string | null;
  withdrawReason: string | null;
}
