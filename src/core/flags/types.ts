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
