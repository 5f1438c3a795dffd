import type { Basis, DomainMinutes, Sex } from '../../core/types.ts';
import type { Modality, ResolvedThreshold, Setting, ThresholdSet } from '../thresholds/thresholds.types.ts';

export const sessionKinds = ['training', 'competition', 'test'] as const;
export type SessionKind = (typeof sessionKinds)[number];

export const qualities = ['ok', 'question', 'suspect'] as const;
export type Quality = (typeof qualities)[number];

/** Repetitions at one intensity, each followed by its recovery; exactly one of the three intensities is there. */
export interface IntervalLine {
  repetitions: number;
  durationS: number;
  powerW?: number | undefined;
  speedMps?: number | undefined;
  heartRateBpm?: number | undefined;
  recoveryS?: number | undefined;
  recoveryPowerW?: number | undefined;
  recoverySpeedMps?: number | undefined;
  recoveryHeartRateBpm?: number | undefined;
}

export interface StrengthSet {
  exercise: string;
  sets: number;
  repetitions: number;
  loadKg: number;
}

export type SessionContent =
  | { kind: 'none' }
  | { kind: 'intervals'; lines: IntervalLine[] }
  | ({ kind: 'domain-minutes' } & DomainMinutes)
  | { kind: 'strength'; sets: StrengthSet[] };

/** What was entered of a session. */
export interface SessionEntry {
  startedAt: Date;
  durationMin: number;
  modality: Modality;
  setting: Setting;
  kind: SessionKind;
  title: string | null;
  distanceM: number | null;
  rating: number | null;
  ratingBy: 'athlete' | 'staff' | null;
  ratingDelayMin: number | null;
  /** How hard staff meant it to be; never load. */
  intendedRating: number | null;
  meanHeartRateBpm: number | null;
  peakHeartRateBpm: number | null;
  content: SessionContent;
  source: string;
  externalId: string | null;
}

export interface SessionRecord extends SessionEntry {
  id: string;
  athleteId: string;
  groupId: string | null;
  zone: string;
  trainingDay: string;
  quality: Quality;
  qualityNotes: string[];
  version: number;
  enteredBy: string | null;
  createdAt: Date;
  updatedAt: Date;
  withdrawnAt: Date | null;
  withdrawReason: string | null;
}

/** Why a session has domain load, has none, or cannot have any. */
export type DomainResult =
  | { state: 'present'; load: number; minutes: DomainMinutes; unassignedMin: number }
  | { state: 'absent'; reason: string; unassignedMin: number | null }
  | { state: 'not-applicable'; reason: string };

export interface OtherMeasure {
  measure: 'banister-of-mean' | 'edwards' | 'three-phase' | 'volume-load';
  /** The function that counted it, and its version. */
  method: string;
  version: string;
  value: number | null;
  /** Why there is no value. */
  reason: string | null;
}

/** What a session weighs, and from what. */
export interface SessionWeight {
  ratingLoad: number | null;
  domain: DomainResult;
  basis: Basis;
  measures: OtherMeasure[];
  /** Only the values that were used, by quantity. */
  thresholdsUsed: ResolvedThreshold[];
  policyId: string | null;
  methodVersion: string;
}

export interface StoredWeight extends SessionWeight {
  weighedAt: Date;
}

export type WeighedSession = SessionRecord & { weight: StoredWeight | null };

/** What weighing looks at besides the session itself. */
export interface WeighContext {
  thresholds: ThresholdSet;
  sex: Sex | null;
  policy: WeighPolicy;
}

export interface BoundRule {
  quantity: 'critical' | 'lt2';
  fallbackLt2Method: string | null;
}

/** The part of a load policy that weighs. */
export interface WeighPolicy {
  id: string | null;
  weights: DomainMinutes;
  bound: BoundRule & { byModality?: Readonly<Partial<Record<string, BoundRule>>> };
}

export interface SessionRevision {
  version: number;
  snapshot: unknown;
  reason: string | null;
  changedBy: string | null;
  changedAt: Date;
}

/** Where one athlete belonged and lived. */
export interface AthleteContext {
  athleteId: string;
  name: string;
  sex: Sex | null;
  memberships: { squadId: string; zone: string; from: string; to: string | null }[];
  zonePeriods: { zone: string; from: string; to: string }[];
}
