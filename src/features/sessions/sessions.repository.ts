import type { AthleteContext, SessionRecord, SessionRevision, StoredWeight, WeighedSession } from './sessions.types.ts';

export interface AthleteDay {
  athleteId: string;
  day: string;
}

/** What is about to be written; see `holdForWriting`. */
export interface WritingPlan {
  /** Squads whose policy is read. */
  squadIds: readonly string[];
  /** Days whose sessions change. */
  days: readonly AthleteDay[];
}

export interface AthletesPlan {
  /** Squads whose policy is read. */
  squadIds: readonly string[];
  /** The squad whose policy changes. */
  changedSquadId: string | null;
  athleteIds: readonly string[];
}

export interface SessionPage {
  athleteId: string;
  from?: string | undefined;
  to?: string | undefined;
  /** Only sessions that stand behind this one in the order newest first. */
  after?: { startedAt: Date; id: string } | undefined;
  limit: number;
}

/** Sessions, what they weigh and their days' sums (port and DI token). */
export abstract class SessionsRepository {
  /** Where these athletes belong and live; unknown ids are left out. */
  abstract athleteContexts(athleteIds: readonly string[]): Promise<Map<string, AthleteContext>>;

  /**
   * Nobody else changes the sessions of these days, the policies of these squads or the thresholds of these athletes
   * until the unit of work ends. All locks of one unit of work are taken in one call, in one order, so that two of them
   * never wait for each other.
   */
  abstract holdForWriting(plan: WritingPlan): Promise<void>;

  /** The same for all days of these athletes; and no session is weighed by the policy of the squad that changes. */
  abstract holdAthletes(plan: AthletesPlan): Promise<void>;

  /** Minutes of the live sessions of each day, without one session: 'athlete|day' → minutes. */
  abstract minutesOfDays(days: readonly AthleteDay[], exceptSessionId?: string): Promise<Map<string, number>>;

  /** Which of these (athlete, source, external id) are there, withdrawn ones too: 'athlete|source|externalId'. */
  abstract knownExternalIds(
    keys: readonly { athleteId: string; source: string; externalId: string }[],
  ): Promise<Set<string>>;

  abstract insert(sessions: readonly (SessionRecord & { weight: StoredWeight })[]): Promise<void>;

  /**
   * Replaces a session and its weight where it still has this version; false where it has not. A withdrawn session has
   * no weight.
   */
  abstract replace(session: WeighedSession, expectedVersion: number): Promise<boolean>;

  abstract insertRevision(sessionId: string, revision: SessionRevision): Promise<void>;
  abstract revisions(sessionId: string): Promise<SessionRevision[]>;

  /** Writes the sums of these days anew from their live sessions; a day without any has no row. */
  abstract recomputeDays(days: readonly AthleteDay[]): Promise<void>;

  abstract find(id: string): Promise<WeighedSession | null>;
  /** Live sessions, newest start first. */
  abstract page(query: SessionPage): Promise<WeighedSession[]>;
}
