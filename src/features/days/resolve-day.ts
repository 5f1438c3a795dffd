import { dayNumber, isoDay } from '../../core/series/day.ts';
import type {
  AthleteDayFacts,
  AvailabilityState,
  Completeness,
  DailyTotal,
  DayRange,
  DayRecord,
  MeasureDay,
  TrainingState,
} from './days.types.ts';

/** Whether a squad's day is closed. */
export type IsClosed = (squadId: string, day: string) => boolean;

/** Every day of an athlete from one to another, in order and without gaps. */
export function resolveDays(facts: AthleteDayFacts, isClosed: IsClosed, from: string, to: string): DayRecord[] {
  const totals = new Map(facts.totals.map((total) => [total.day, total]));
  const unknownDays = new Set(facts.unknownDays);
  const records: DayRecord[] = [];
  const last = dayNumber(to);
  for (let number = dayNumber(from); number <= last; number += 1) {
    const day = isoDay(number);
    const squadId = facts.memberships.find((stay) => covers(stay, day))?.squadId ?? null;
    const absence = facts.availability.find((entry) => covers(entry, day));
    records.push(
      resolveDay({
        day,
        squadId,
        closed: squadId !== null && isClosed(squadId, day),
        namedUnknown: unknownDays.has(day),
        availability: absence?.state ?? 'full',
        away: absence?.away ?? false,
        total: totals.get(day),
      }),
    );
  }
  return records;
}

export interface DayFacts {
  day: string;
  squadId: string | null;
  closed: boolean;
  namedUnknown: boolean;
  availability: AvailabilityState;
  away: boolean;
  total: DailyTotal | undefined;
}

/**
 * What is known of one day. Missing is not rest: a day without a session is rest only where staff closed it without
 * naming the athlete, or where the athlete could not train. Somebody who is merely away may have trained elsewhere.
 */
export function resolveDay({ day, squadId, closed, namedUnknown, availability, away, total }: DayFacts): DayRecord {
  const sessions = total?.sessions ?? 0;
  const accounted = closed && !namedUnknown;
  const unavailable = availability === 'none' && !away;
  const completeness = completenessOf(sessions, accounted, { unavailable: unavailable && !namedUnknown, away });
  return {
    day,
    squadId,
    closed,
    training: trainingOf(sessions, completeness),
    availability,
    away,
    completeness,
    rating: measureOf(completeness, total?.ratingLoad ?? 0, total?.ratingMissing ?? 0),
    domain: measureOf(completeness, total?.domainLoad ?? 0, total?.domainMissing ?? 0),
    sessions,
    minutes: total?.minutes ?? 0,
    domainMinutes: {
      moderate: total?.moderateMin ?? 0,
      heavy: total?.heavyMin ?? 0,
      severe: total?.severeMin ?? 0,
      extreme: total?.extremeMin ?? 0,
    },
    applicableMin: total?.applicableMin ?? 0,
    coveredMin: total?.coveredMin ?? 0,
    basisMinutes: total?.basisMinutes ?? {},
    suspect: total?.suspect ?? 0,
  };
}

function completenessOf(
  sessions: number,
  accounted: boolean,
  { unavailable, away }: { unavailable: boolean; away: boolean },
): Completeness {
  if (sessions > 0) return accounted ? 'complete' : 'partial';
  if (unavailable) return 'complete';
  return accounted && !away ? 'complete' : 'unknown';
}

function trainingOf(sessions: number, completeness: Completeness): TrainingState {
  if (sessions > 0) return 'trained';
  return completeness === 'complete' ? 'rest' : 'unknown';
}

/** A sum is a lower bound while the day is partial or one of its sessions lacks the measure. */
function measureOf(completeness: Completeness, sum: number, missing: number): MeasureDay {
  if (completeness === 'unknown') return { state: 'unknown', value: NaN };
  return { state: completeness === 'partial' || missing > 0 ? 'partial' : 'known', value: sum };
}

function covers({ from, to }: DayRange, day: string): boolean {
  return from <= day && (to === null || day <= to);
}
