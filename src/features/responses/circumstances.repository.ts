import type { Circumstance } from './circumstances.types.ts';

/** Circumstances (port and DI token). */
export abstract class CircumstancesRepository {
  abstract insert(circumstance: Circumstance): Promise<void>;
  /** Of the squad and its athletes, those that were not withdrawn, by first day. */
  abstract list(squadId: string): Promise<Circumstance[]>;
  /** False when it was withdrawn before. */
  abstract withdraw(id: string, reason: string, at: Date): Promise<boolean>;
}
