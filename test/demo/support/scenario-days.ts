import { timeInDomainFromBouts } from '../../../src/core/domains/time-in-domain-from-bouts.ts';
import { timeInDomainFromHeartRate } from '../../../src/core/domains/time-in-domain-from-heart-rate.ts';
import { extremeBoundCycling } from '../../../src/core/domains/extreme-bound.ts';
import { domainLoad } from '../../../src/core/load/domain-load.ts';
import { sessionRatingLoad } from '../../../src/core/load/session-rating-load.ts';
import { dayNumber } from '../../../src/core/series/day.ts';
import type { Basis, DayValue, DomainMinutes } from '../../../src/core/types.ts';
import type { Scenario, ScenarioSession } from '../../../src/demo/scenario.types.ts';

/** One athlete's day as the scenario alone, weighed with the core's functions, says it was. */
export interface ScenarioDay {
  day: number;
  domain: DayValue;
  rating: DayValue;
  minutes: number;
  applicableMin: number;
  coveredMin: number;
  basisMinutes: Partial<Record<Basis, number>>;
  modalities: Set<string>;
  unavailable: boolean;
  longestRunM: number;
}

export interface Weighed {
  minutes: DomainMinutes | null;
  load: number;
  basis: Basis;
}

type Lookup = (quantity: string, modality: string, day: string) => number;

/** Looks up the value in force on a day: the newest of the athlete's that is not of a later date. */
function thresholdsOf(scenario: Scenario, athlete: string): Lookup {
  const values = Map.groupBy(
    scenario.thresholds.filter((batch) => batch.athlete === athlete).flatMap((batch) => batch.values),
    (entry) => `${entry.quantity} ${entry.modality ?? 'other'}`,
  );
  for (const list of values.values()) list.sort((a, b) => a.validFrom.localeCompare(b.validFrom));
  return (quantity, modality, day) => {
    const value = values.get(`${quantity} ${modality}`)?.findLast(({ validFrom }) => validFrom <= day)?.value;
    if (value === undefined) throw new Error(`${athlete} has no ${quantity} in ${modality} on ${day}`);
    return value;
  };
}

/** Domain minutes and load of a session; strength is not applicable (null with load 0), no lines give NaN. */
export function weigh(inForce: Lookup, session: ScenarioSession): Weighed {
  const { modality, day, content, durationMin } = session;
  if (modality === 'strength') return { minutes: null, load: 0, basis: 'rating' };
  if (content?.kind !== 'intervals') return { minutes: null, load: NaN, basis: 'rating' };
  const value = (quantity: string) => inForce(quantity, modality, day);
  const rests = content.lines.reduce((sum, line) => sum + (line.repetitions * (line.recoveryS ?? 0)) / 60, 0);
  const bouts = content.lines.map((line) => ({
    durationMin: line.durationS / 60,
    repetitions: line.repetitions,
    intensity: line.powerW ?? line.heartRateBpm ?? NaN,
  }));
  const each = bouts.flatMap(({ repetitions, ...bout }) => Array.from({ length: repetitions }, () => bout));
  const byPower = content.lines.every((line) => line.powerW !== undefined);
  const worked = byPower
    ? timeInDomainFromBouts(each, {
        lt1: value('lt1-power'),
        heavySevere: value('critical-power'),
        extreme: modality === 'cycling' ? extremeBoundCycling(value('critical-power'), value('w-prime')) : null,
      })
    : timeInDomainFromHeartRate(
        each.map((bout) => ({ durationMin: bout.durationMin, heartRateBpm: bout.intensity })),
        { lt1: value('lt1-heart-rate'), heavySevere: value('lt2-heart-rate'), extreme: null },
      ).minutes;
  const minutes = { ...worked, moderate: worked.moderate + rests };
  const assigned = minutes.moderate + minutes.heavy + minutes.severe + minutes.extreme;
  if (durationMin - assigned > 0.1 * durationMin) return { minutes: null, load: NaN, basis: 'rating' };
  return { minutes, load: domainLoad(minutes), basis: byPower ? 'interval' : 'heart-rate' };
}

/** All days of the log of one athlete. */
export function scenarioDays(scenario: Scenario, athlete: string): ScenarioDay[] {
  const closings = new Map(scenario.closings.map(({ day, unknown }) => [day, unknown]));
  const bySession = Map.groupBy(
    scenario.sessions.filter((session) => session.athlete === athlete),
    ({ day }) => day,
  );
  const inForce = thresholdsOf(scenario, athlete);
  const first = dayNumber(scenario.firstDay);
  return Array.from({ length: 84 }, (_, index) => {
    const day = new Date((first + index) * 86_400_000).toISOString().slice(0, 10);
    const sessions = bySession.get(day) ?? [];
    const closed = closings.has(day) && !closings.get(day)!.includes(athlete);
    const unavailable = scenario.availability.some(
      (one) => one.athlete === athlete && one.state === 'none' && one.from <= day && day <= one.to,
    );
    return dayOf(inForce, first + index, sessions, closed, unavailable);
  });
}

function dayOf(inForce: Lookup, day: number, sessions: ScenarioSession[], closed: boolean, unavailable: boolean) {
  const weighed = sessions.map((session) => ({ session, ...weigh(inForce, session) }));
  const value = (loads: readonly number[]): DayValue => {
    const sum = loads.filter((load) => !Number.isNaN(load)).reduce((a, b) => a + b, 0);
    if (loads.length === 0) return closed || unavailable ? known(day, 0) : { day, state: 'unknown', value: NaN };
    return closed && loads.every((load) => !Number.isNaN(load))
      ? known(day, sum)
      : { day, state: 'partial', value: sum };
  };
  const applicable = weighed.filter(({ session }) => session.modality !== 'strength');
  const covered = applicable.filter(({ minutes }) => minutes !== null);
  const basisMinutes: Partial<Record<Basis, number>> = {};
  for (const { basis, session } of covered) basisMinutes[basis] = (basisMinutes[basis] ?? 0) + session.durationMin;
  const sum = (of: typeof weighed) => of.reduce((total, { session }) => total + session.durationMin, 0);
  return {
    day,
    domain: value(weighed.map(({ load }) => load)),
    rating: value(
      sessions.map(({ rating, durationMin }) => (rating === undefined ? NaN : sessionRatingLoad(rating, durationMin))),
    ),
    minutes: sum(weighed),
    applicableMin: sum(applicable),
    coveredMin: sum(covered),
    basisMinutes,
    modalities: new Set(applicable.map(({ session }) => session.modality)),
    unavailable,
    longestRunM: Math.max(0, ...sessions.map(({ distanceM = 0 }) => distanceM)),
  };
}

function known(day: number, value: number): DayValue {
  return { day, state: 'known', value };
}
