import type { GroupSessionInput, SessionInput } from './sessions.schema.ts';
import type { SessionEntry } from './sessions.types.ts';

/** What was entered, with everything that was left out said as null. */
export function sessionEntry(input: SessionInput): SessionEntry {
  return {
    startedAt: new Date(input.startedAt),
    durationMin: input.durationMin,
    modality: input.modality,
    setting: input.setting,
    kind: input.kind,
    title: input.title ?? null,
    distanceM: input.distanceM ?? null,
    rating: input.rating ?? null,
    ratingBy: input.rating === undefined ? null : (input.ratingBy ?? 'athlete'),
    ratingDelayMin: input.ratingDelayMin ?? null,
    intendedRating: input.intendedRating ?? null,
    meanHeartRateBpm: input.meanHeartRateBpm ?? null,
    peakHeartRateBpm: input.peakHeartRateBpm ?? null,
    content: input.content ?? { kind: 'none' },
    source: input.source,
    externalId: input.externalId ?? null,
  };
}

/** The session of each athlete of a group: what is said of the athlete stands before what is said of all. */
export function groupEntries({ session, athletes }: GroupSessionInput): { athleteId: string; entry: SessionEntry }[] {
  return athletes.map(({ athleteId, durationMin = session.durationMin, ...own }) => ({
    athleteId,
    entry: sessionEntry({ ...session, ...own, durationMin }),
  }));
}
