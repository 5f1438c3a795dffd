import type { Basis, DayState, DomainMinutes, Measure } from '../../core/types.ts';
import type { LoadPolicySettings, RatioForm } from '../policies/policies.types.ts';
import type { AvailabilityState, Completeness, TrainingState } from '../days/days.types.ts';

export type { RatioForm };

/** What of a squad's policy decides how a series is read. */
export type SeriesSettings = Pick<LoadPolicySettings, 'primaryMeasure' | 'ratio' | 'monotony'>;

/** Share of the covered minutes by what they were counted from, in percent. */
export type BasisMix = Partial<Record<Basis, number>>;

export interface RatioReading {
  form: RatioForm;
  value: number | null;
  /** Bounds from the three ways through unknown days; exponential form only. */
  low: number | null;
  high: number | null;
  knownDays: { acute: number; acuteOf: number; chronic: number; chronicOf: number };
  /** Domain load only: how the minutes of the two windows were counted. */
  basisMix: { acute: BasisMix; chronic: BasisMix } | null;
  /** Why there is no value. */
  withheld?: string;
}

/** A component read on the morning of a day, in load units and in percent of the own 26-week median. */
export interface ComponentReading {
  units: number | null;
  low: number | null;
  high: number | null;
  share: number | null;
  shareLow: number | null;
  shareHigh: number | null;
  withheld?: string;
}

export interface MeasureReading {
  state: DayState;
  /** Known sum (0 = rest), the lower bound of a partial day, null where unknown. */
  value: number | null;
}

/** One day of one athlete. Windowed figures end on the day; components are read on its morning. */
export interface SeriesRow {
  day: string;
  training: TrainingState;
  availability: AvailabilityState;
  away: boolean;
  completeness: Completeness;
  sessions: number;
  minutes: number;
  domain: MeasureReading;
  rating: MeasureReading;
  domainMinutes: DomainMinutes;
  /** Mean per known day of the primary measure. */
  acute: number | null;
  chronic: number | null;
  ratio: RatioReading;
  monotony: number | null;
  strain: number | null;
  longLoad: ComponentReading;
  shortLoad: ComponentReading;
  /** Day n of the return after time out, and the chronic load in percent of before (null: not known). */
  returning: { dayN: number; share: number | null } | null;
  /** Reasons in words, one a withheld figure. */
  withheld: Partial<Record<'acute' | 'chronic' | 'ratio' | 'monotony' | 'strain' | 'longLoad' | 'shortLoad', string>>;
}

/** The morning after the last closed day: the components hold the same days as the windows that end on it. */
export interface MorningAfter {
  day: string;
  longLoad: ComponentReading;
  shortLoad: ComponentReading;
}

/** All days of one athlete's log up to the last closed one, with what is computed from them. */
export interface AthleteSeries {
  athleteId: string;
  /** The measure ratio, monotony, strain and components are of, and why. */
  measure: Measure;
  measureReason: string;
  form: RatioForm;
  sd: 'population' | 'sample';
  firstDay: string;
  /** The squad's last closed training day. */
  lastDay: string;
  rows: SeriesRow[];
  after: MorningAfter;
}

/** A sum over a window with the number of days it rests on. */
export interface WindowSum {
  /** Sum over known days plus the lower bounds of partial ones. */
  sum: number;
  knownDays: number;
  of: number;
}

/** One athlete's week as the Monday report reads it. */
export interface WeekFigures {
  sessions: number;
  daysComplete: number;
  /** Days of the week on which the athlete belonged to the squad. */
  daysOf: number;
  domainMinutes: DomainMinutes;
  domainLoad: WindowSum;
  ratingLoad: WindowSum;
  /** The 28 days that end on the last closed day. */
  domainLoad28: WindowSum;
  /** Week's load of the primary measure in percent of the own usual week. */
  share: { value: number | null; atLeast: boolean; withheld: string | null; usualWeeks: number };
  /** How the minutes of those 28 days were counted, in percent. */
  basisMix: BasisMix;
}

/** Everything of a squad that a week's report rests on. */
export interface SquadWeek {
  isoWeek: string;
  from: string;
  to: string;
  /** The last closed training day not after the week; null: none is closed yet. */
  lastDay: string | null;
  closedDays: number;
  policy: { id: string; validFrom: string; settings: LoadPolicySettings };
  athletes: { athleteId: string; name: string; series: AthleteSeries | null; week: WeekFigures | null }[];
}
