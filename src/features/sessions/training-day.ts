import { localDay } from '../../platform/zoned-time.ts';
import type { AthleteContext } from './sessions.types.ts';

export interface TrainingPlace {
  day: string;
  zone: string;
  /** The squad the athlete belongs to that day; null outside every membership. */
  squadId: string | null;
}

/**
 * The training day of a start: its date in the zone the athlete lives in for a while, else in the zone of the squad the
 * athlete belongs to on that date. Outside every membership the date is that of the nearest squad's zone.
 */
export function trainingPlace({ memberships, zonePeriods }: AthleteContext, startedAt: Date): TrainingPlace | null {
  const away = zonePeriods.find(({ zone, from, to }) => isWithin(localDay(startedAt, zone), from, to));
  if (away !== undefined) {
    const day = localDay(startedAt, away.zone);
    return {
      day,
      zone: away.zone,
      squadId: memberships.find(({ from, to }) => isWithin(day, from, to))?.squadId ?? null,
    };
  }
  const home = memberships.find(({ zone, from, to }) => isWithin(localDay(startedAt, zone), from, to));
  if (home !== undefined) return { day: localDay(startedAt, home.zone), zone: home.zone, squadId: home.squadId };
  const [first] = memberships;
  return first === undefined ? null : { day: localDay(startedAt, first.zone), zone: first.zone, squadId: null };
}

function isWithin(day: string, from: string, to: string | null): boolean {
  return from <= day && (to === null || day <= to);
}
