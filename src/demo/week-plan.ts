import { runs } from './cast.ts';
import { testDays } from './physiology.ts';
import type { Slot } from './recipes.ts';
import type { CastRole, ScenarioAthlete } from './scenario.types.ts';

export const weeks = 12;
export const logDays = 7 * weeks;

/** Days of the log, 0 = the first Monday, on which something happens; the same in every scenario. */
export const events = {
  unload: { from: 49, to: 55 },
  illness: { from: 56, to: 64 },
  overloadOver: { from: 56, to: 76 },
  overloadNow: { from: 70, to: 90 },
  rib: { from: 70, to: 76 },
  camp: { from: 77, to: 83 },
  lightBeforeSpike: { from: 56, to: 69 },
  driftFrom: 35,
} as const;

export function during(dayIndex: number, { from, to }: { from: number; to: number }): boolean {
  return dayIndex >= from && dayIndex <= to;
}

// Hard and easy days take turns, one day of the week is free.
const usual: readonly (readonly Slot[])[] = [
  ['water-steady', 'strength-whole'],
  ['erg-intervals', 'run-easy'],
  ['bike-easy'],
  ['water-pieces', 'strength-trunk'],
  [],
  ['water-long', 'erg-tempo'],
  ['run-sunday'],
];
const onBikeOnly: readonly (readonly Slot[])[] = [
  ['bike-easy'],
  ['bike-intervals'],
  ['bike-easy'],
  ['bike-intervals'],
  [],
  ['bike-long'],
  ['bike-sunday'],
];
const camp: readonly (readonly Slot[])[] = [
  ['water-steady'],
  ['water-pieces'],
  ['water-steady'],
  ['water-pieces'],
  [],
  ['water-long', 'water-pieces'],
  ['water-steady'],
];

/** The sessions of one athlete's day. */
export function slotsOn(athlete: ScenarioAthlete, dayIndex: number): Slot[] {
  const has = (role: CastRole) => athlete.roles.includes(role);
  const weekday = dayIndex % 7;
  if (has('ill') && during(dayIndex, events.illness)) return [];
  if (has('rib') && during(dayIndex, events.rib)) return [...onBikeOnly[weekday]!];
  if (has('camp') && during(dayIndex, events.camp)) return [...camp[weekday]!];
  const slots = usual[weekday]!.flatMap((slot): Slot[] => {
    if (slot === 'run-easy') return runs(athlete) ? [slot] : [];
    if (slot === 'run-sunday') return runs(athlete) ? [slot] : ['bike-sunday'];
    return [slot];
  });
  return dayIndex === testDays(athlete).second ? ['erg-test', ...slots.slice(1)] : slots;
}

/** The squad's plan: how much of a usual week is asked in each of the twelve. */
const weekFactors = [0.94, 1, 1.05, 0.9, 1, 1.05, 0.96, 0.78, 0.98, 1.04, 1.06, 1];

/** The week's part in how much of a usual session is done. */
export function weekShare(dayIndex: number): number {
  return weekFactors[Math.floor(dayIndex / 7)]!;
}

/** The part that belongs to what happens to this athlete. */
export function ownShare(athlete: ScenarioAthlete, dayIndex: number): number {
  const has = (role: CastRole) => athlete.roles.includes(role);
  if (has('overload-over')) {
    if (during(dayIndex, events.overloadOver)) return 1.35;
    return dayIndex > events.overloadOver.to ? 0.7 : 1;
  }
  if (has('overload-now') && during(dayIndex, events.overloadNow)) return 1.3;
  if (has('ill') && dayIndex > events.illness.to) return dayIndex < 70 ? 0.5 : dayIndex < 77 ? 0.7 : 0.85;
  if (has('load-spike')) {
    if (during(dayIndex, events.lightBeforeSpike)) return 0.65;
    return dayIndex >= 77 ? 2 : 1;
  }
  return 1;
}
