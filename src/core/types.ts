/** Intensity domain: moderate up to the first threshold, heavy up to the heavy/severe bound, severe, extreme. */
export type Domain = 'moderate' | 'heavy' | 'severe' | 'extreme';

/** Minutes (or weights) by intensity domain. */
export interface DomainMinutes {
  readonly moderate: number;
  readonly heavy: number;
  readonly severe: number;
  readonly extreme: number;
}

/** Bounds of the domains, all in one unit: W, m/s or beats per minute. `extreme: null`: severe and extreme together. */
export interface Bounds {
  readonly lt1: number;
  readonly heavySevere: number;
  readonly extreme: number | null;
}

/** What the minutes of a session were counted from. 'interval': hand-entered intervals; 'minutes': hand-given minutes. */
export type Basis = 'power' | 'speed' | 'interval' | 'minutes' | 'heart-rate' | 'rating';

/** What a series of daily loads is made of. */
export type Measure = 'domain-load' | 'rating-load';

/** What is known of a day: everything, a part (its sum is a lower bound), nothing. */
export type DayState = 'known' | 'partial' | 'unknown';

/** One athlete, one measure, one day; series are in order and without gaps. */
export interface DayValue {
  /** Days since 1970-01-01. */
  readonly day: number;
  readonly state: DayState;
  /** known: the sum, 0 = rest; partial: the lower bound; unknown: NaN. */
  readonly value: number;
}

/** A value with its bounds. */
export interface Banded {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}

/** Acute load, chronic load and their ratio by day; NaN where too little is known. */
export interface AcuteChronic {
  readonly acute: number[];
  readonly chronic: number[];
  readonly ratio: number[];
}

/** Sex as the published heart-rate constants use it. */
export type Sex = 'female' | 'male';

/** Constants of the two-component impulse–response model: gains per load unit, time constants in days. */
export interface ImpulseGains {
  readonly k1: number;
  readonly k2: number;
  readonly tau1: number;
  readonly tau2: number;
}

/** The same with the level without any training. */
export interface ImpulseParameters extends ImpulseGains {
  readonly p0: number;
}

/** Long and short load on one day, in load units and in percent of the own median. */
export interface LongShortLoad {
  readonly longUnits: Banded;
  readonly shortUnits: Banded;
  readonly longShare: Banded;
  readonly shortShare: Banded;
}

/** Why load figures do not speak on a day. */
export type Muting = 'planned-overload' | 'unload' | 'taper' | 'unavailable' | 'return';

/** What can raise a load concern. */
export type LoadConcernMeasure = 'ratio' | 'chronic-low' | 'monotony-strain' | 'spike';

/** One athlete's figures on one day, as far as the log reaches that day. */
export interface LoadConcernDay {
  readonly day: number;
  /** Acute:chronic ratio; NaN unknown or withheld. */
  readonly ratio: number;
  /** Chronic load; NaN unknown. */
  readonly chronic: number;
  /** Monotony and strain of the 7 days that end on this day; NaN unknown. */
  readonly monotony: number;
  readonly strain: number;
  readonly muted: Muting | null;
  /** A running session longer than the longest of the 30 days before, by this many percent. */
  readonly spike: { readonly percent: number; readonly sessionId: string } | null;
}

/** Size of a single-session spike; the first is no spike. */
export type SpikeClass = 'reference' | 'small' | 'moderate' | 'large';

/** One measure's part in an episode: its figures on the last day it was open and had a value. */
export interface LoadEvidence {
  readonly measure: LoadConcernMeasure;
  readonly value: number;
  readonly limit: number;
  /** The day of value and limit. */
  readonly day: number;
  readonly since: number;
  /** The first day on which this measure no longer stood; null while it stands. */
  readonly until: number | null;
  /** True where fewer than 56 days of log left the general limit alone. */
  readonly shortHistory?: boolean;
  /** For 'monotony-strain': the week's strain and the largest of the six blocks before. */
  readonly strain?: number;
  readonly strainLimit?: number;
  /** For 'spike'. */
  readonly spikeClass?: SpikeClass;
  readonly sessionId?: string;
}

/** A stretch of days on which at least one load measure stood; one piece of evidence, never added up. */
export interface Episode {
  readonly since: number;
  /** The first day on which nothing stood any more; null while something stands. */
  readonly until: number | null;
  readonly strongest: LoadConcernMeasure;
  readonly evidence: LoadEvidence[];
}

/** A stretch of days of any other kind with its evidence. */
export interface Stretch<Evidence> {
  readonly since: number;
  readonly until: number | null;
  readonly evidence: Evidence;
}
