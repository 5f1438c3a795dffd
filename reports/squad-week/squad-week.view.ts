/**
 * What the Monday report says, as plain JSON: the workbook, the charts and the mail show exactly this and compute
 * nothing of their own. Numbers are unrounded; null means withheld or not there, and the reason stands beside it.
 */

export type Level = 'none' | 'note' | 'watch' | 'act';

/** A figure, or the words that stand in its place. */
export interface Cell {
  value: number | null;
  /** Short words shown instead of the value: '5 of 7 days in'. */
  instead: string | null;
  /** True where the value is the sum of what is known of a window that is not wholly known: a lower bound. */
  atLeast?: boolean;
}

/** One flag as the report shows it. */
export interface FlagLine {
  kind: string;
  level: Exclude<Level, 'none'>;
  since: string;
  /** Claim and comparison with self. */
  claim: string;
  /** The question to ask or the next step. */
  ask: string;
  sentence: string;
  clears: string;
  evidence: unknown;
}

/** One row of the first sheet. */
export interface AthleteLine {
  athleteId: string;
  name: string;
  availability: string;
  level: Level;
  /** True for the athletes the first sentence counts. */
  talk: boolean;
  sentence: string;
  since: string | null;
  ask: string;
  /** Week's load in percent of the own usual week. */
  weekShare: Cell;
  sessionsDone: number;
  daysComplete: number;
  /** Days of the week on which the athlete belonged to the squad, up to the report's last day. */
  daysOf: number;
}

export interface RatioCell extends Cell {
  form: RatioForm;
  acute: number | null;
  chronic: number | null;
  knownDays: { acute: number; acuteOf: number; chronic: number; chronicOf: number };
}

export type RatioForm = 'rolling-coupled' | 'rolling-uncoupled' | 'exponential';

/** Long or short load read on the morning after the last day: units, and percent of the own median with its bounds. */
export interface ComponentCell extends Cell {
  low: number | null;
  high: number | null;
  units: number | null;
  unitsLow: number | null;
  unitsHigh: number | null;
}

/** One row of the second sheet, and the unrounded figures for whoever checks them. */
export interface AthleteMeasures {
  athleteId: string;
  name: string;
  primaryMeasure: 'domain-load' | 'rating-load';
  primaryReason: string;
  /** Minutes in each domain this week. */
  domainMinutes: { moderate: number; heavy: number; severe: number; extreme: number };
  domainLoad: { week: Cell; weekKnownDays: number; last28: Cell; last28KnownDays: number };
  ratingLoad: { week: Cell; weekKnownDays: number };
  ratio: RatioCell;
  monotony: Cell;
  strain: Cell;
  longLoad: ComponentCell;
  shortLoad: ComponentCell;
  /** Share of minutes by basis over the chronic window, in percent. */
  basisMix: Record<string, number>;
  /** 'rowing from 24 Nov': thresholds that came into use this week, so that domain load before and after differ. */
  thresholdsChanged: string[];
  /** 'ratio: 20 of 28 days in', one line a withheld figure. */
  withheld: string[];
  flags: FlagLine[];
}

export interface ChartDay {
  day: string;
  /** 'after': the morning after the last closed day, on which only long and short load are read. */
  state: 'known' | 'partial' | 'unknown' | 'after';
  load: number | null;
  acute: number | null;
  chronic: number | null;
  knownOf28: number | null;
  long: Band | null;
  short: Band | null;
}

export interface Band {
  value: number;
  low: number;
  high: number;
}

/** The panels of one flagged athlete; the same days on every panel. */
export interface AthleteChart {
  athleteId: string;
  name: string;
  measure: 'domain-load' | 'rating-load';
  /** Upper limit of the ratio, for the band over the chronic load. */
  ratioLimit: number;
  ratioForm: RatioForm;
  /** 'share' in percent of the own 26-week median, 'units' before eight weeks of log. */
  componentScale: 'share' | 'units';
  days: ChartDay[];
  /** First and last day of spells without training for lack of availability, shaded. */
  unavailable: { from: string; to: string }[];
  /** What the picture shows, in words. */
  altText: string;
}

export interface MethodLine {
  topic: string;
  text: string;
  source: string;
}

/** What changed since last Monday's report. */
export interface Changes {
  /** ISO week of the report compared with; null: this is the first one. */
  since: string | null;
  fresh: string[];
  better: string[];
  unchanged: string[];
}

export interface SquadWeekView {
  schema: 1;
  squad: { id: string; name: string; zone: string };
  isoWeek: string;
  from: string;
  to: string;
  /** The last closed training day; every figure ends on it. Null: no day of the squad is closed yet. */
  asOf: string | null;
  /** Long and short load are read on the morning of this day. */
  readOn: string | null;
  headline: string;
  /** The people the headline counts. */
  talk: string[];
  /** Athletes of whom too few days are known to compare with. */
  unjudged: number;
  line: {
    athletes: number;
    plan: string;
    sessionsDone: number;
    full: number;
    modified: number;
    unavailable: number;
    away: number;
    daysComplete: number;
    daysOf: number;
    closedDays: number;
    closedOf: number;
    nextWeek: string;
  };
  changes: Changes;
  athletes: AthleteLine[];
  measures: AthleteMeasures[];
  charts: AthleteChart[];
  method: MethodLine[];
  cautions: string[];
}

/** What is printed about the record itself; not part of the view, so that equal views stay equal. */
export interface Edition {
  version: number;
  change: string | null;
}

export const LEVEL_WORDS: Record<Level, string> = { none: '–', note: '● note', watch: '▲ watch', act: '■ act' };
export const NO_PLAN = 'no plan';

export const FORM_WORDS: Record<RatioForm, string> = {
  'rolling-coupled': 'rolling, coupled 7:28',
  'rolling-uncoupled': 'rolling, uncoupled 7:21',
  exponential: 'exponential 7:28',
};

export const MEASURE_WORDS = { 'domain-load': 'domain load', 'rating-load': 'rating load' } as const;

const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'];

/** '2026-11-29' → '29 Nov'. */
export function shortDate(day: string): string {
  return `${Number(day.slice(8))} ${MONTHS[Number(day.slice(5, 7)) - 1]}`;
}

/** '2026-11-29' → '29 Nov 2026'. */
export function longDate(day: string): string {
  return `${shortDate(day)} ${day.slice(0, 4)}`;
}

/** '2026-W48' → 'week 48'. */
export function weekWords(isoWeek: string): string {
  return `week ${Number(isoWeek.slice(6))}`;
}

/** The squad line of the first sheet and of the mail. */
export function squadLine(view: SquadWeekView): string {
  const { line } = view;
  const away = [
    line.unavailable > 0 ? `${line.unavailable} not available` : null,
    line.away > 0 ? `${line.away} away` : null,
    line.modified > 0 ? `${line.modified} on modified training` : null,
  ].filter((part) => part !== null);
  return [
    `Planned: ${line.plan}`,
    `done: ${line.sessionsDone} ${line.sessionsDone === 1 ? 'session' : 'sessions'}`,
    away.length > 0
      ? away.join(', ')
      : line.full === line.athletes && line.full > 0
        ? 'everybody fully available'
        : `${line.full} of ${line.athletes} fully available`,
    `log complete on ${line.daysComplete} of ${line.daysOf} athlete days (${line.closedDays} of ${line.closedOf} days closed)`,
    `key days next week: ${line.nextWeek}`,
  ].join(' · ');
}
