import { dayNumber, mondayOf } from '../../core/series/day.ts';
import { median } from '../../core/series/median.ts';
import type { DomainMinutes, Measure } from '../../core/types.ts';
import type { DayRecord } from '../days/days.types.ts';
import { minutesIn, shares } from './basis-mix.ts';
import type { WeekFigures, WindowSum } from './series.types.ts';

const WEEK = 7;
const USUAL_WEEKS = 26;
const USUAL_MIN_WEEKS = 4;
const SHARE_MIN_KNOWN = 6;

/**
 * One athlete's week. `records` end on the last closed day; days of the week after it are not in yet.
 * The usual week is the median of the own earlier full weeks, at most 26, from 4 on; a full week has 7 of 7 days known.
 */
export function weekFigures(
  records: readonly DayRecord[],
  monday: string,
  measure: Measure,
  squadId: string,
): WeekFigures {
  const from = dayNumber(monday);
  const week = records.filter((record) => within(record, from, from + WEEK - 1));
  const outside = week.filter((record) => record.squadId !== squadId).length;
  const last28 = records.slice(-28);
  return {
    sessions: week.reduce((sum, record) => sum + record.sessions, 0),
    daysComplete: week.filter((record) => record.completeness === 'complete' && record.squadId === squadId).length,
    daysOf: WEEK - outside - daysBeforeLog(records, from),
    domainMinutes: domainMinutes(week),
    domainLoad: windowSum(week, 'domain-load', WEEK),
    ratingLoad: windowSum(week, 'rating-load', WEEK),
    domainLoad28: windowSum(last28, 'domain-load', 28),
    share: weekShare(records, from, measure),
    basisMix: shares(minutesIn(records, records.length - 28, records.length - 1)),
  };
}

function daysBeforeLog(records: readonly DayRecord[], from: number): number {
  const first = records[0];
  return first === undefined ? 0 : Math.min(WEEK, Math.max(0, dayNumber(first.day) - from));
}

function within(record: DayRecord, from: number, to: number): boolean {
  const day = dayNumber(record.day);
  return day >= from && day <= to;
}

function domainMinutes(records: readonly DayRecord[]): DomainMinutes {
  const sum = { moderate: 0, heavy: 0, severe: 0, extreme: 0 };
  for (const { domainMinutes: minutes } of records) {
    sum.moderate += minutes.moderate;
    sum.heavy += minutes.heavy;
    sum.severe += minutes.severe;
    sum.extreme += minutes.extreme;
  }
  return sum;
}

function windowSum(records: readonly DayRecord[], measure: Measure, of: number): WindowSum {
  const days = records.map((record) => (measure === 'domain-load' ? record.domain : record.rating));
  return {
    sum: days.reduce((sum, day) => sum + (day.state === 'unknown' ? 0 : day.value), 0),
    knownDays: days.filter((day) => day.state === 'known').length,
    of,
  };
}

function weekShare(records: readonly DayRecord[], monday: number, measure: Measure): WeekFigures['share'] {
  const weeks = new Map<number, DayRecord[]>();
  for (const record of records) {
    const start = mondayOf(dayNumber(record.day));
    weeks.set(start, [...(weeks.get(start) ?? []), record]);
  }
  const full = [...weeks]
    .filter(([start]) => start < monday)
    .map(([, days]) => windowSum(days, measure, WEEK))
    .filter((week) => week.knownDays === WEEK)
    .slice(-USUAL_WEEKS);
  const now = windowSum(weeks.get(monday) ?? [], measure, WEEK);
  const none = { value: null, atLeast: false, usualWeeks: full.length };
  if (full.length < USUAL_MIN_WEEKS) return { ...none, withheld: `${full.length} of ${USUAL_MIN_WEEKS} full weeks in` };
  if (now.knownDays < SHARE_MIN_KNOWN) return { ...none, withheld: `${now.knownDays} of ${WEEK} days known` };
  const usual = median(full.map((week) => week.sum));
  if (!(usual > 0)) return { ...none, withheld: 'own usual week is 0' };
  const atLeast = now.knownDays < WEEK;
  return { value: (100 * now.sum) / usual, atLeast, withheld: null, usualWeeks: full.length };
}
