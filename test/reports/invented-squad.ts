import { dayNumber, isoDay, weekday } from '../../src/core/series/day.ts';
import type { DayRecord } from '../../src/features/days/days.types.ts';
import { evaluateFlags } from '../../src/features/flags/evaluate-flags.ts';
import type { PlannedPeriod, ThresholdUse } from '../../src/features/flags/flags.types.ts';
import { flagWords } from '../../src/features/flags/sentences.ts';
import { defaultSettings } from '../../src/features/policies/default-settings.ts';
import { buildSeries } from '../../src/features/series/build-series.ts';
import type { SquadWeek } from '../../src/features/series/series.types.ts';
import { weekFigures } from '../../src/features/series/week-figures.ts';
import { buildView } from '../../reports/squad-week/build-view.ts';
import type { SquadWeekView } from '../../reports/squad-week/squad-week.view.ts';

const SQUAD = { id: '0190a000-0000-7000-8000-000000000001', name: 'Women’s eight', zone: 'Europe/Prague' };
const MONDAY = '2026-11-23';
const SUNDAY = '2026-11-29';
const FIRST = dayNumber('2026-08-10');

export type Story = 'usual' | 'jump' | 'gap' | 'return' | 'overload' | 'old-test' | 'suspect' | 'new' | 'away';

/** A day of the log; a number is a day's minutes, all of them in the moderate domain unless told otherwise. */
export function dayOf(day: string, minutes: number | null, changes: Partial<DayRecord> = {}): DayRecord {
  const known = minutes !== null;
  const done = minutes ?? 0;
  const domainMinutes = { moderate: 0.8 * done, heavy: 0.15 * done, severe: 0.05 * done, extreme: 0 };
  const domain = domainMinutes.moderate + 2 * domainMinutes.heavy + 3 * domainMinutes.severe;
  return {
    day,
    squadId: SQUAD.id,
    closed: true,
    training: known ? (done > 0 ? 'trained' : 'rest') : 'unknown',
    availability: 'full',
    away: false,
    completeness: known ? 'complete' : 'unknown',
    rating: { state: known ? 'known' : 'unknown', value: known ? 4 * done : NaN },
    domain: { state: known ? 'known' : 'unknown', value: known ? domain : NaN },
    sessions: done > 0 ? 1 : 0,
    minutes: done,
    domainMinutes,
    applicableMin: done,
    coveredMin: done,
    basisMinutes: done > 0 ? { interval: done } : {},
    suspect: 0,
    ...changes,
  };
}

/** Minutes by weekday, Monday first, moved a little from week to week by a rule without chance. */
function usualMinutes(day: number, seed: number): number {
  const week = Math.floor((day - FIRST) / 7);
  const plan = [0, 95, 120, 45, 130, 170, 40][weekday(day) - 1]!;
  const wave = [1, 1.1, 1.15, 0.8][week % 4]!;
  return Math.round(plan * wave * (0.9 + 0.2 * (((seed * 37 + day * 17) % 11) / 10)));
}

function records(story: Story, seed: number): DayRecord[] {
  const first = story === 'new' ? dayNumber('2026-11-16') : FIRST;
  const end = dayNumber(SUNDAY);
  return Array.from({ length: end - first + 1 }, (_, i) => {
    const day = first + i;
    const left = end - day;
    const minutes = usualMinutes(day, seed);
    const iso = isoDay(day);
    if (story === 'jump' && left < 7) return dayOf(iso, Math.round(2.2 * minutes + 30));
    if (story === 'gap' && (left < 5 || (left > 30 && left < 34))) return dayOf(iso, left % 2 === 0 ? null : minutes);
    if (story === 'return' && left > 8 && left < 27) return dayOf(iso, 0, { availability: 'none' });
    if (story === 'return' && left <= 8) return dayOf(iso, Math.round(0.5 * minutes), { availability: 'modified' });
    if (story === 'suspect' && left === 2) return dayOf(iso, minutes, { suspect: 1 });
    if (story === 'away' && left < 2) return dayOf(iso, null, { away: true });
    return dayOf(iso, minutes);
  });
}

/** A squad without chance in it: the same view every time. */
export function inventedView(
  members: readonly { name: string; story: Story }[],
  options: { previous?: SquadWeekView | null } = {},
): SquadWeekView {
  const logs = members.map(({ name, story }, seed) => {
    const athleteId = `0190a000-0000-7000-8000-0000000001${String(seed).padStart(2, '0')}`;
    const days = records(story, seed);
    return { athleteId, name, story, days, series: buildSeries(athleteId, days, defaultSettings) };
  });
  const periods: PlannedPeriod[] = logs
    .filter(({ story }) => story === 'overload')
    .map(({ athleteId }) => ({ squadId: 's', athleteId, purpose: 'overload', from: '2026-11-19', to: '2026-12-02' }));
  const week: SquadWeek = {
    isoWeek: '2026-W48',
    from: MONDAY,
    to: SUNDAY,
    lastDay: SUNDAY,
    closedDays: 7,
    policy: { id: 'p', validFrom: '2000-01-01', settings: defaultSettings },
    athletes: logs.map(({ athleteId, name, days, series }) => ({
      athleteId,
      name,
      series,
      week: weekFigures(days, MONDAY, series.measure, SQUAD.id),
    })),
  };
  const flags = logs.flatMap(({ athleteId, days, series, story }) => {
    const newest = story === 'old-test' ? '2026-09-07' : '2026-10-19';
    const thresholdUse: ThresholdUse[] = days
      .filter(({ minutes }) => minutes > 0)
      .map(({ day }) => ({ athleteId, day, modality: 'rowing', newest: day < newest ? '2026-08-10' : newest }));
    const own = periods.filter((period) => period.athleteId === athleteId);
    return evaluateFlags({
      records: days,
      series,
      periods: own,
      runs: [],
      thresholdUse,
      settings: defaultSettings,
    }).map((episode) => ({ athleteId, squadId: SQUAD.id, ...episode, ...flagWords(episode) }));
  });
  return buildView({ squad: SQUAD, week, flags, thresholdsChanged: new Map(), previous: options.previous ?? null });
}

export const SIXTEEN: readonly { name: string; story: Story }[] = [
  { name: 'Adéla Brožová', story: 'usual' },
  { name: 'Barbora Čechová', story: 'jump' },
  { name: 'Dana Dvořáková', story: 'usual' },
  { name: 'Eliška Faltová', story: 'gap' },
  { name: 'Hana Holubová', story: 'usual' },
  { name: 'Iva Janečková', story: 'return' },
  { name: 'Jana Kalinová', story: 'usual' },
  { name: 'Klára Lišková', story: 'overload' },
  { name: 'Lenka Marešová', story: 'usual' },
  { name: 'Marie Nedvědová', story: 'old-test' },
  { name: 'Nela Opletalová', story: 'suspect' },
  { name: 'Olga Pokorná', story: 'new' },
  { name: 'Petra Růžičková', story: 'usual' },
  { name: 'Radka Šimková', story: 'away' },
  { name: 'Soňa Tichá', story: 'usual' },
  { name: 'Tereza Urbanová', story: 'usual' },
];
