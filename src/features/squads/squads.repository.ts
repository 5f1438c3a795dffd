import type { MemberStay, Squad, SquadPerson } from './squads.types.ts';

/** Squads and who belongs to them (port and DI token). */
export abstract class SquadsRepository {
  abstract insert(squad: Squad & { createdAt: Date }): Promise<void>;
  abstract find(id: string): Promise<Squad | null>;
  /** All of the club, or those named; by name. */
  abstract list(ids?: readonly string[]): Promise<Squad[]>;
  /** Stays that touch [from, to], by name, then first day. */
  abstract stays(squadId: string, from: string, to: string): Promise<MemberStay[]>;
  /** People with the role coach in this squad or club-wide, by name. */
  abstract coaches(squadId: string): Promise<SquadPerson[]>;
}
