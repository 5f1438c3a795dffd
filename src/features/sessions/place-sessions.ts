import type { SessionFault } from './session-faults.ts';
import type { AthleteContext, SessionEntry } from './sessions.types.ts';
import { trainingPlace } from './training-day.ts';

export interface NewSession {
  athleteId: string;
  entry: SessionEntry;
}

/** A session with its training day and the squad of that day. */
export interface PlacedSession extends NewSession {
  index: number;
  athlete: AthleteContext;
  day: string;
  zone: string;
  squadId: string;
}

/**
 * Gives each session its training day. For one squad, an athlete who was never in it is answered like one who is not there.
 * Refused: a start in the future, an athlete who is not there, a day outside every
 * membership, or outside the one squad the sessions are for.
 */
export function placeSessions(
  sessions: readonly NewSession[],
  contexts: ReadonlyMap<string, AthleteContext>,
  { now, squadId }: { now: Date; squadId?: string },
): { placed: PlacedSession[]; faults: SessionFault[] } {
  const placed: PlacedSession[] = [];
  const faults: SessionFault[] = [];
  sessions.forEach(({ athleteId, entry }, index) => {
    const refuse = (field: string, value: unknown, allowed: string) =>
      faults.push({ index, kind: 'rule', field, value, allowed });
    const athlete = contexts.get(athleteId);
    const place = athlete === undefined ? null : trainingPlace(athlete, entry.startedAt);
    const foreign = squadId !== undefined && !athlete?.memberships.some((stay) => stay.squadId === squadId);
    if (athlete === undefined || place === null || foreign) {
      refuse('athleteId', athleteId, 'an athlete of the squad');
    } else if (entry.startedAt > now) {
      refuse('startedAt', entry.startedAt.toISOString(), `not in the future: up to ${now.toISOString()}`);
    } else if (place.squadId === null || (squadId !== undefined && place.squadId !== squadId)) {
      refuse('startedAt', place.day, membershipWords(athlete, squadId));
    } else {
      placed.push({ athleteId, entry, index, athlete, day: place.day, zone: place.zone, squadId: place.squadId });
    }
  });
  return { placed, faults };
}

function membershipWords({ memberships }: AthleteContext, squadId: string | undefined): string {
  const stays = memberships.filter((stay) => squadId === undefined || stay.squadId === squadId);
  if (stays.length === 0) return 'a training day on which the athlete belongs to the squad';
  const spans = stays.map(({ from, to }) => (to === null ? `from ${from} on` : `from ${from} to ${to}`));
  return `a training day within the membership, ${spans.join(' or ')}`;
}
