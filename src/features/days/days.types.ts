import type { Basis, DayState, DomainMinutes } from '../../core/types.ts';

/** What is known of an athlete's training on a day. Missing is not rest. */
export type TrainingState = 'trained' | 'rest' | 'unknown';

/** Whether the day's log is whole. Partial counts as unknown for every floor. */
export type Completeness = 'complete' | 'partial' | 'unknown';

export type AvailabilityState = 'full' | 'modified' | 'none';

/** One measure on one day: known sum (0 = rest), lower bound of a partial day, or NaN. */
export interface MeasureDay {
  state: DayState;
  value: number;
}

/** One athlete's training day as every series reads it. */
export interface DayRecord {
  /** 'YYYY-MM-DD', the date in the zone the athlete trained in. */
  day: string;
  /** The squad the athlete belongs to that day; null outside every membership (such a day is unknown). */
  squadId: string | null;
  /** Whether that squad's day is closed. */
  closed: boolean;
  training: TrainingState;
  availability: AvailabilityState;
  /** Not with the squad that day: training unknown unless something was logged. */
  away: boolean;
  completeness: Completeness;
  rating: MeasureDay;
  domain: MeasureDay;
  sessions: number;
  /** Minutes of all sessions. */
  minutes: number;
  /** Minutes by domain of the sessions that have them. */
  domainMinutes: DomainMinutes;
  /** Minutes of sessions to which domain load applies (strength and games do not), and those of them that have it. */
  applicableMin: number;
  coveredMin: number;
  /** Covered minutes by what they were counted from. */
  basisMinutes: Partial<Record<Basis, number>>;
  /** Sessions kept with the quality mark 'suspect'. */
  suspect: number;
}

/** Sums of one athlete's day as they are stored. */
export interface DailyTotal {
  athleteId: string;
  day: string;
  sessions: number;
  minutes: number;
  ratingLoad: number;
  /** Sessions that lack a rating, and sessions whose domain load is absent. */
  ratingMissing: number;
  domainLoad: number;
  domainMissing: number;
  moderateMin: number;
  heavyMin: number;
  severeMin: number;
  extremeMin: number;
  applicableMin: number;
  coveredMin: number;
  basisMinutes: Partial<Record<Basis, number>>;
  suspect: number;
}

/** A stretch of days, both ends included; no end = open. */
export interface DayRange {
  from: string;
  to: string | null;
}

export interface SquadClosing {
  squadId: string;
  day: string;
  closedAt: string;
  closedBy: string | null;
  unknownAthleteIds: string[];
}

/** Everything that says what one athlete's days were, over one stretch of days. */
export interface AthleteDayFacts {
  athleteId: string;
  memberships: (DayRange & { squadId: string })[];
  totals: DailyTotal[];
  /** Days on which staff could not account for the athlete. */
  unknownDays: string[];
  availability: (DayRange & { state: AvailabilityState; away: boolean })[];
}

/** One athlete's row of a squad's day. */
export interface SquadDayAthlete extends Pick<
  DayRecord,
  'training' | 'availability' | 'completeness' | 'minutes' | 'sessions'
> {
  athleteId: string;
  name: string;
  /** Known sum, or the lower bound of a partial day; null where unknown. */
  ratingLoad: number | null;
  domainLoad: number | null;
  ratingState: DayState;
  domainState: DayState;
}

export interface SquadDayView {
  day: string;
  closed: boolean;
  athletes: SquadDayAthlete[];
}
