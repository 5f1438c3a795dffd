import type { SpikeClass } from '../../core/types.ts';
import type { LoadPolicySettings } from '../policies/policies.types.ts';

export const flagKinds = [
  'load-concern',
  'return',
  'recovering',
  'planned-overload',
  'log-gap',
  'data-suspect',
  'thresholds-out-of-date',
] as const;
export type FlagKind = (typeof flagKinds)[number];
export type FlagLevel = 'note' | 'watch' | 'act';

/** One load measure's part in a load concern, with the day its figures are of. */
export interface LoadPart {
  measure: 'ratio' | 'chronic-low' | 'monotony-strain' | 'spike';
  value: number;
  limit: number;
  day: string;
  since: string;
  /** Last day it stood; null while it stands. */
  until: string | null;
  shortHistory?: boolean;
  /** For 'chronic-low': the own median the limit is a share of. */
  usual?: number;
  strain?: number;
  strainLimit?: number;
  spikeClass?: SpikeClass;
  sessionId?: string;
}

/** What a flag rests on; `day` is the last day it stood within the log. */
export type FlagEvidence =
  | {
      kind: 'load-concern';
      day: string;
      strongest: LoadPart['measure'];
      parts: LoadPart[];
      /** The policy's limit of the ratio. */
      ratioLimit: number;
      loadMeasure: string;
      form: string;
    }
  | { kind: 'return'; day: string; dayN: number; share: number | null }
  | { kind: 'recovering'; day: string; dayN: number; of: number }
  | { kind: 'planned-overload'; day: string; dayN: number; of: number; ratio: number | null }
  | { kind: 'log-gap'; day: string; known: number; of: number }
  | { kind: 'data-suspect'; day: string; sessions: number; lastSeen: string }
  | {
      kind: 'thresholds-out-of-date';
      day: string;
      modality: string;
      newest: string;
      ageDays: number;
      limitDays: number;
    };

/** A stretch of days on which a flag stood, both ends included. */
export interface FlagEpisode {
  kind: FlagKind;
  level: FlagLevel;
  since: string;
  until: string | null;
  evidence: FlagEvidence;
}

export interface FlagWords {
  /** One claim and one comparison with the athlete's own earlier days. */
  claim: string;
  /** One question, or the next step. */
  ask: string;
  /** Claim and question in one sentence. */
  sentence: string;
  clears: string;
}

export interface AthleteFlag extends FlagEpisode, FlagWords {
  athleteId: string;
  squadId: string;
}

/** A flag on record. */
export interface StoredFlag extends AthleteFlag {
  id: string;
  /** The last closed day when its content was last written. */
  asOf: string;
}

/** A running session with a distance; competitions are left out. */
export interface RunEvidence {
  athleteId: string;
  day: string;
  sessionId: string;
  distanceM: number;
}

/** A day on which thresholds of a modality were used, and the newest of them (first threshold and heavy/severe bound). */
export interface ThresholdUse {
  athleteId: string;
  day: string;
  modality: string;
  newest: string;
}

export interface PlannedPeriod {
  squadId: string;
  /** Null: the whole squad. */
  athleteId: string | null;
  purpose: 'overload' | 'unload' | 'taper';
  from: string;
  to: string;
}

/** What of the policy decides on flags. */
export type FlagSettings = Pick<LoadPolicySettings, 'ratio' | 'monotony' | 'chronicLowShare' | 'thresholdMaxAgeWeeks'>;
