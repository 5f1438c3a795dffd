import type { Athlete, Membership, ZonePeriod } from './athletes.types.ts';

/** Athletes, their squads and their zones (port and DI token). */
export abstract class AthletesRepository {
  abstract insert(athlete: Athlete & { createdAt: Date }): Promise<void>;
  abstract find(id: string): Promise<Athlete | null>;
  /** By name; of the given squads on this day, or of the whole club. */
  abstract list(filter: { squadIds: readonly string[]; day: string } | null): Promise<Athlete[]>;
  abstract insertMembership(membership: Membership): Promise<void>;
  /** By first day. */
  abstract memberships(athleteId: string): Promise<Membership[]>;
  abstract endMembership(id: string, to: string): Promise<void>;
  abstract insertZonePeriod(period: ZonePeriod): Promise<void>;
  /** By first day. */
  abstract zonePeriods(athleteId: string): Promise<ZonePeriod[]>;
}
