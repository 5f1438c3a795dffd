import type { Morning, MorningRevision } from './mornings.types.ts';

/** Mornings (port and DI token). */
export abstract class MorningsRepository {
  abstract insert(morning: Morning): Promise<void>;
  /** The morning of that day that was not withdrawn. */
  abstract find(athleteId: string, day: string): Promise<Morning | null>;
  /** Those that were not withdrawn, by athlete and day; both days included. */
  abstract list(athleteIds: readonly string[], from: string, to: string): Promise<Morning[]>;
  /** False when it is no longer the version the change is based on. */
  abstract replace(morning: Morning, basedOn: number): Promise<boolean>;
  abstract insertRevision(morningId: string, revision: MorningRevision): Promise<void>;
  /** Oldest first, of every morning of that day, withdrawn ones too. */
  abstract revisions(athleteId: string, day: string): Promise<MorningRevision[]>;
}
