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

export type {
  Episode,
  LoadConcernDay,
  LoadConcernMeasure,
  LoadEvidence,
  Muting,
  SpikeClass,
  Stretch,
} from './flags/types.ts';
