import type { AthleteDayFacts, SquadClosing } from './days.types.ts';

/** Closings, and all that says what days were (port and DI token). */
export abstract class DaysRepository {
  /** What is known of these athletes' days, read in one statement; unknown ids are left out. */
  abstract facts(athleteIds: readonly string[], from: string, to: string): Promise<AthleteDayFacts[]>;

  /** The first day of each athlete's log: with a session, or closed within a membership. Athletes without are left out. */
  abstract firstDays(athleteIds: readonly string[]): Promise<Map<string, string>>;

  /** Closed days of several squads: squad → days. */
  abstract closedDays(squadIds: readonly string[], from: string, to: string): Promise<Map<string, string[]>>;

  /** Closings of a squad with the athletes named unknown, by day. */
  abstract closings(squadId: string, from: string, to: string): Promise<SquadClosing[]>;

  abstract lastClosedDay(squadId: string, until: string): Promise<string | null>;

  /** Closes a day, or closes it anew with other athletes named unknown. */
  abstract close(squadId: string, day: string, closedAt: Date, unknownAthleteIds: readonly string[]): Promise<void>;

  /** False if it was not closed. */
  abstract reopen(squadId: string, day: string): Promise<boolean>;
}
