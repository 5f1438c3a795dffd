import { describe, expect, test } from '@jest/globals';
import { athleteKey, squadSize } from '../../src/demo/cast.ts';
import { addDays, daysBetween, lastCompleteSunday, localDay } from '../../src/demo/days.ts';
import { scenario, scenarioNumbers } from '../../src/demo/scenario.ts';
import type { CastRole, Scenario, ScenarioSession } from '../../src/demo/scenario.types.ts';
import { scenarioDays } from './support/scenario-days.ts';

const today = '2026-12-01';
const all = Array.from({ length: scenarioNumbers.last }, (_, index) => scenario(index + 1, today));

function ofAthlete(one: Scenario, key: string): ScenarioSession[] {
  return one.sessions.filter(({ athlete }) => athlete === key);
}

function lineMinutes({ content }: ScenarioSession): number {
  if (content?.kind !== 'intervals') return 0;
  return content.lines.reduce(
    (sum, line) => sum + (line.repetitions * (line.durationS + (line.recoveryS ?? 0))) / 60,
    0,
  );
}

function plausible(session: ScenarioSession): boolean {
  const { durationMin, rating = 5, content, group, intendedRating } = session;
  const minutes = lineMinutes(session);
  const lines = content?.kind === 'intervals' ? content.lines : [];
  return (
    durationMin > 20 &&
    durationMin <= 300 &&
    rating >= 1 &&
    rating <= 10 &&
    2 * rating === Math.round(2 * rating) &&
    minutes <= durationMin &&
    (lines.length === 0 || minutes > 0.9 * durationMin) &&
    lines.every(({ heartRateBpm, durationS }) => heartRateBpm === undefined || durationS >= 180) &&
    (group === null || intendedRating !== undefined)
  );
}

describe('the invented scenario', () => {
  test('is the same for the same number and last Sunday, and another for another number', () => {
    expect(scenario(3, '2026-11-30')).toEqual(scenario(3, '2026-12-06'));
    expect(new Set(all.map((one) => one.athletes.map(({ name }) => name).join())).size).toBe(20);
    expect(scenario(1, today).sessions).not.toEqual(scenario(2, today).sessions);
  });

  test('logs more than a thousand athlete-sessions of sixteen athletes in twelve weeks', () => {
    for (const one of all) {
      expect(one.athletes).toHaveLength(squadSize);
      expect(daysBetween(one.firstDay, one.lastSunday)).toBe(83);
      expect(one.sessions.length).toBeGreaterThanOrEqual(1000);
      expect(one.athletes.filter(({ uneventful }) => uneventful).length).toBeGreaterThanOrEqual(8);
      expect(one.closings).toHaveLength(82);
    }
  });

  test('keeps the cast of roles in every scenario', () => {
    const cast: CastRole[] = [
      ...(['drifting', 'twin', 'overload-over', 'overload-now', 'camp', 'stale-thresholds', 'ill', 'rib'] as const),
      ...(['gaps', 'load-spike', 'late-threshold'] as const),
    ];
    for (const one of all) {
      expect(new Set(one.athletes.flatMap(({ roles }) => roles))).toEqual(new Set(cast));
      expect(one.thresholds.some(({ late }) => late)).toBe(true);
      expect(one.zonePeriods).toHaveLength(2);
      for (const { purpose, from, to } of one.loadPeriods) {
        if (purpose === 'overload') expect(daysBetween(from, to) + 1).toBeLessThanOrEqual(21);
      }
    }
  });

  test('says things an own address and a plausible body would say', () => {
    for (const one of all) {
      const people = [...one.athletes, ...one.staff];
      expect(new Set(people.map(({ email }) => email)).size).toBe(people.length);
      for (const { email } of people) expect(email).toMatch(/^[a-z.-]+@[a-z-]+\.example$/);
      for (const { athlete, values } of one.thresholds) {
        const of = (quantity: string, modality?: string) =>
          values.find((entry) => entry.quantity === quantity && entry.modality === modality)!.value;
        for (const modality of ['rowing', 'cycling']) {
          expect(of('lt1-power', modality)).toBeLessThan(of('lt2-power', modality));
          expect(of('lt2-power', modality)).toBeLessThan(of('critical-power', modality));
        }
        for (const modality of ['rowing', 'running']) {
          expect(of('resting-heart-rate')).toBeLessThan(of('lt1-heart-rate', modality));
          expect(of('lt1-heart-rate', modality)).toBeLessThan(of('lt2-heart-rate', modality));
          expect(of('lt2-heart-rate', modality)).toBeLessThan(of('max-heart-rate', modality));
        }
        expect(one.athletes.map(({ key }) => key)).toContain(athlete);
      }
    }
  });

  test('keeps every session inside the ranges of the interface', () => {
    for (const one of all) {
      expect(new Set(one.sessions.map(({ externalId }) => externalId)).size).toBe(one.sessions.length);
      expect(one.sessions.filter((session) => !plausible(session))).toEqual([]);
    }
  });

  test('lets nobody do two things at once, and starts every session on its own training day', () => {
    for (const one of all) {
      const zones = new Map(one.zonePeriods.map((period) => [period.athlete, period]));
      for (const { key } of one.athletes) {
        const away = zones.get(key);
        const starts = ofAthlete(one, key).map((session) => ({ session, start: Date.parse(session.startedAt) }));
        const wrong = starts.filter(({ session, start }, index) => {
          const before = starts[index - 1];
          const zone = away !== undefined && session.day >= away.from ? away.zone : one.zone;
          const busy = before !== undefined && start < before.start + before.session.durationMin * 60_000;
          return busy || localDay(new Date(start), zone) !== session.day;
        });
        expect(wrong).toEqual([]);
      }
    }
  });

  test('makes the twin do the drifting athlete’s sessions with the same domain loads and ordinary ratings', () => {
    for (const one of all) {
      const [drifting, twin] = [athleteKey(0), athleteKey(1)];
      const loads = (key: string) => scenarioDays(one, key).map(({ domain }) => domain);
      expect(loads(twin)).toEqual(loads(drifting));
      const shape = (key: string) =>
        ofAthlete(one, key).map(({ day, title, durationMin }) => [day, title, durationMin]);
      expect(shape(twin)).toEqual(shape(drifting));
      const lastWeeks = (key: string) => {
        const ratings = ofAthlete(one, key).flatMap(({ day, rating }) =>
          rating !== undefined && day > addDays(one.lastSunday, -21) ? [rating] : [],
        );
        return ratings.reduce((a, b) => a + b, 0) / ratings.length;
      };
      expect(lastWeeks(drifting)).toBeGreaterThan(lastWeeks(twin) + 0.8);
    }
  });

  test('ends with the last complete week: a Sunday’s own week is not complete', () => {
    expect(lastCompleteSunday('2026-11-30')).toBe('2026-11-29');
    expect(lastCompleteSunday('2026-11-29')).toBe('2026-11-22');
    expect(scenario(1, '2027-01-04').isoWeek).toBe('2026-W53');
    expect(scenario(1, '2027-01-03').isoWeek).toBe('2026-W52');
  });
});
