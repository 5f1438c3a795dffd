import type { Principal, Reach, TargetKind } from './access.types.ts';

/** Who is asking, and to whom a thing belongs (port and DI token). */
export abstract class AccessRepository {
  /** The person behind a token that is neither revoked nor expired at this moment. */
  abstract principal(tokenHash: Buffer, now: Date): Promise<Principal | null>;
  /**
   * To whom a thing belongs; null if it is not there. An athlete belongs to the squads of today and later; one who has
   * left all of them to the last.
   */
  abstract reach(kind: TargetKind, id: string, today: string): Promise<Reach | null>;
}
