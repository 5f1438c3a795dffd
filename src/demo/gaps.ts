import { loadKey } from './cast.ts';
import { pick, wholeBetween } from './seeded.ts';
import { logDays } from './week-plan.ts';
import type { ScenarioAthlete } from './scenario.types.ts';

/**
 * What is missing from a log: 'unknown' a day staff could not account for, 'no-rating' an own session without its
 * rating, 'no-lines' an own session of which only a mean heart rate or the rating is known.
 */
export type Gap = 'unknown' | 'no-rating' | 'no-lines';

/** Days no one closed: a Friday in the first half, a Wednesday in week 9 or 10. */
export function unclosedDays(scenario: number): number[] {
  return [7 * wholeBetween(2, 4, scenario, 'unclosed Friday') + 4, 7 * wholeBetween(8, 9, scenario, 'unclosed') + 2];
}

/** The last weeks are logged whole but for the athlete with the gaps: the last report should have figures to show. */
const lastGapDay = logDays - 21;

/** One athlete's gaps by day of the log, far enough apart that every window stays long enough; 'gaps' has more. */
export function gapsOf(scenario: number, athlete: ScenarioAthlete): Map<number, Gap> {
  const key = loadKey(athlete);
  const unclosed = unclosedDays(scenario);
  const gaps = new Map<number, Gap>();
  let day = wholeBetween(9, 16, scenario, key, 'first gap');
  while (day < lastGapDay) {
    const clear = unclosed.every((other) => Math.abs(other - day) > 8);
    if (clear) gaps.set(day, kindOn(day, pick(['unknown', 'no-rating', 'no-lines'], scenario, key, day)));
    day += clear ? wholeBetween(12, 24, scenario, key, day, 'next gap') : wholeBetween(3, 20, scenario, key, day, 'on');
  }
  if (athlete.roles.includes('gaps')) {
    for (const missed of [19, 45, 47, 48, 61, 78, 80]) gaps.set(missed, 'unknown');
  }
  return gaps;
}

/** Only Wednesday's and Sunday's sessions are the athlete's own to log. */
function kindOn(day: number, wanted: Gap): Gap {
  return day % 7 === 2 || day % 7 === 6 ? wanted : 'unknown';
}
