import { describe, expect, test } from '@jest/globals';
import { dayNumber } from '../../src/core/series/day.ts';
import { scenario, scenarioNumbers } from '../../src/demo/scenario.ts';
import type { CastRole, Scenario } from '../../src/demo/scenario.types.ts';
import { scenarioDays } from './support/scenario-days.ts';
import { allSundays, viewOn } from './support/scenario-flags.ts';

const numbers = Array.from({ length: scenarioNumbers.last }, (_, index) => index + 1);

/** What is open on the last Sunday, by athlete, in days counted back from it. */
function lastSunday(one: Scenario) {
  return one.athletes.map(({ key }) => {
    const { flags, measure, ratio, mixed } = viewOn(one, key, scenarioDays(one, key), 84);
    return { key, measure, ratio, mixed, flags };
  });
}

describe('flags of the scenario, computed from its data with the core’s functions', () => {
  test('leave the uneventful athletes alone on every Monday of every scenario', () => {
    let athleteWeeks = 0;
    let notes = 0;
    for (const number of numbers) {
      const one = scenario(number, '2026-12-01');
      for (const { key } of one.athletes.filter(({ uneventful }) => uneventful)) {
        const sundays = allSundays(one, key);
        athleteWeeks += sundays.length;
        // Load concern, log gap and thresholds out of date are notes at most; none of them is above.
        notes += sundays.reduce((sum, { flags }) => sum + flags.length, 0);
        const last = sundays.at(-1)!;
        expect({ key, number, measure: last.measure, shown: last.ratio > 0.8 && last.ratio < 1.2 }).toEqual({
          ...{ key, number, measure: 'domain-load', shown: true },
        });
      }
    }
    expect(athleteWeeks).toBe(20 * 8 * 12);
    expect(notes).toBeLessThanOrEqual(athleteWeeks / 10);
  });

  test('say of every role what the role is there for', () => {
    const kinds: Partial<Record<CastRole, string[]>> = {
      'overload-over': ['recovering'],
      'overload-now': ['within'],
      'stale-thresholds': ['thresholds-out-of-date'],
      ill: ['return'],
      rib: [],
      gaps: ['log-gap'],
      'load-spike': ['load-concern'],
      drifting: [],
    };
    for (const number of numbers) {
      const one = scenario(number, '2026-12-01');
      const views = lastSunday(one);
      for (const [role, expected] of Object.entries(kinds)) {
        const { key } = one.athletes.find(({ roles }) => roles.includes(role as CastRole))!;
        const view = views.find((candidate) => candidate.key === key)!;
        expect({ number, role, kinds: view.flags.map(({ kind }) => kind) }).toEqual({ number, role, kinds: expected });
        if (role === 'load-spike') expect(view.flags[0]!.sinceDaysAgo).toBeLessThan(14);
      }
      const camp = one.athletes.filter(({ roles }) => roles.includes('camp')).map(({ key }) => key);
      expect(views.filter(({ mixed }) => mixed).map(({ key }) => key)).toEqual(camp);
    }
  });

  test('are the same counted back from the last Sunday, whatever day it is', () => {
    const days = [
      ...['2026-03-29', '2026-03-30', '2026-10-25', '2026-10-26'], // both clock changes, a Sunday and a Monday each
      ...['2027-01-03', '2027-01-04', '2026-12-01', '2028-03-01'], // around ISO week 53, a Tuesday, after a leap day
    ];
    const expected = lastSunday(scenario(1, days[0]!));
    const firsts = new Set<number>();
    for (const today of days) {
      const one = scenario(1, today);
      firsts.add(dayNumber(one.firstDay));
      expect(lastSunday(one)).toEqual(expected);
    }
    expect(firsts.size).toBeGreaterThan(5);
  });
});
