import type { Club } from './clubs.types.ts';

/** Clubs, as the operator sees them (port and DI token). */
export abstract class ClubsRepository {
  abstract insert(club: Club & { createdAt: Date }): Promise<void>;
  /** Waits until no other unit of work makes a club with this key, then keeps others waiting until this one ends. */
  abstract holdKey(externalKey: string): Promise<void>;
  abstract findByKey(externalKey: string): Promise<Club | null>;
}
