import { castOf } from './cast.ts';
import { addDays, isoWeek, lastCompleteSunday } from './days.ts';
import { gapsOf, unclosedDays } from './gaps.ts';
import { thresholdBatches } from './physiology.ts';
import { pick } from './seeded.ts';
import { train } from './train.ts';
import { during, events, logDays, slotsOn } from './week-plan.ts';
import type { CastRole, Closing, Scenario, ScenarioAthlete, ScenarioSession } from './scenario.types.ts';

export const scenarioNumbers = { first: 1, last: 20 } as const;

const squadZone = 'Europe/Oslo';
const campZones = ['Europe/Lisbon', 'Atlantic/Canary', 'Europe/Athens', 'Africa/Johannesburg'];

/**
 * Twelve invented weeks of an invented rowing squad that end with the last complete ISO week before `today`.
 * Everything is counted from that week's Sunday; the number varies names, loads and gaps and keeps the cast of roles.
 */
export function scenario(number: number, today: string): Scenario {
  const lastSunday = lastCompleteSunday(today);
  const firstDay = addDays(lastSunday, 1 - logDays);
  const cast = castOf(number, firstDay);
  const campZone = pick(campZones, number, 'camp');
  const log = logOf(number, firstDay, cast.athletes, campZone);
  const span = ({ from, to }: { from: number; to: number }) => ({
    from: addDays(firstDay, from),
    to: addDays(firstDay, to),
  });
  const keys = (role: CastRole) => cast.athletes.filter(({ roles }) => roles.includes(role)).map(({ key }) => key);
  return {
    number,
    firstDay,
    lastSunday,
    isoWeek: isoWeek(lastSunday),
    zone: squadZone,
    ...cast,
    ...log,
    thresholds: cast.athletes.flatMap((athlete) => thresholdBatches(number, athlete, firstDay)),
    availability: [
      ...keys('ill').map((athlete) => ({
        athlete, state: 'none' as const, cause: 'illness' as const, reason: 'fever and cough', ...span(events.illness),
      })),
      ...keys('rib').map((athlete) => ({
        athlete, state: 'modified' as const, cause: 'complaint' as const, reason: 'sore rib when rowing',
        allowedModalities: ['cycling'], ...span(events.rib),
      })),
    ], // prettier-ignore
    zonePeriods: keys('camp').map((athlete) => ({ athlete, zone: campZone, ...span(events.camp) })),
    loadPeriods: [
      { athlete: null, purpose: 'unload', ...span(events.unload), note: 'lighter week after the tests' },
      ...keys('overload-over').map((athlete) => overload(athlete, span(events.overloadOver))),
      ...keys('overload-now').map((athlete) => overload(athlete, span(events.overloadNow))),
    ],
  };
}

function overload(athlete: string, days: { from: string; to: string }) {
  return { athlete, purpose: 'overload' as const, ...days, note: 'planned: three weeks of more' };
}

/** Sessions and closings of all days. */
function logOf(number: number, firstDay: string, athletes: readonly ScenarioAthlete[], campZone: string) {
  const sessions: ScenarioSession[] = [];
  const closings: Closing[] = [];
  const unclosed = unclosedDays(number);
  const gaps = new Map(athletes.map((athlete) => [athlete.key, gapsOf(number, athlete)]));
  for (let dayIndex = 0; dayIndex < logDays; dayIndex += 1) {
    const unknown: string[] = [];
    for (const athlete of athletes) {
      const gap = gaps.get(athlete.key)!.get(dayIndex);
      const away = athlete.roles.includes('camp') && during(dayIndex, events.camp);
      const place = { scenario: number, firstDay, zone: away ? campZone : squadZone };
      if (gap === 'unknown') unknown.push(athlete.key);
      else {
        slotsOn(athlete, dayIndex).forEach((slot, order) => {
          sessions.push(train(place, athlete, dayIndex, slot, order, gap));
        });
      }
    }
    if (!unclosed.includes(dayIndex)) closings.push({ day: addDays(firstDay, dayIndex), unknown });
  }
  return { sessions, closings };
}
