/** A value of one day and what may be done with it. */
export interface MeasuredDay {
  readonly day: number;
  /** NaN: not measured. */
  readonly value: number;
  /** May enter the own baseline. */
  readonly inBaseline: boolean;
  /** May be judged, so that it can be a sign. */
  readonly judged: boolean;
}

/** Mean and spread of the own stable days. */
export interface OwnBaseline {
  readonly mean: number;
  /** Sample standard deviation. */
  readonly sd: number;
  /** Values it rests on. */
  readonly count: number;
  /** First and last of the days looked at. */
  readonly from: number;
  readonly to: number;
}

/** One fixed submaximal bout. */
export interface StandardBout {
  readonly day: number;
  /** Name of its rating as a measured value: that of the session's rating where they are one. */
  readonly id: string;
  /** Definition and work; only bouts of one key are compared. */
  readonly key: string;
  readonly heartRateBpm: number;
  /** CR-10 right after the bout. */
  readonly rating: number;
  readonly heartRateTypicalError: number;
  readonly ratingTypicalError: number;
  readonly inBaseline: boolean;
  readonly judged: boolean;
}

/** A maximal result: of a criterion test, or of a competition. */
export interface CriterionResult {
  readonly day: number;
  readonly id: string;
  /** Definition; only results of one key are compared. */
  readonly key: string;
  readonly kind: 'test' | 'competition';
  readonly value: number;
  /** Of one result [unit of the value]. */
  readonly typicalError: number;
  readonly higherIsBetter: boolean;
  readonly inBaseline: boolean;
  readonly judged: boolean;
}

/** One sign: what was measured beside what was expected of this athlete, in the unit of the measure. */
export interface SignPoint {
  readonly day: number;
  readonly value: number;
  readonly expected: number;
  /** Own spread the departure is measured in. */
  readonly spread: number;
  /** The value beyond which it is a sign. */
  readonly limit: number;
  /** Names of the measured values it rests on; a value counts in one family only. */
  readonly sources: readonly string[];
}

/** What is measured; signs of one family never add up. */
export type SignFamily = 'morning-answers' | 'effort-mismatch' | 'standard-bout' | 'variability';

/** How a family stands on one day. */
export interface FamilyDay {
  readonly day: number;
  /** Enough signs to stand. */
  readonly raised: boolean;
  /** Raised, or raised earlier and not cleared yet. */
  readonly open: boolean;
  /** The day it was raised; null while it is not open. */
  readonly since: number | null;
  /** The earliest of the signs that raised it; null while it is not open. */
  readonly firstSign: number | null;
  /** Days (variability: weeks; standard bouts: bouts) looked at. */
  readonly measured: number;
  /** The signs among them. */
  readonly signs: readonly SignPoint[];
}
