import type { LoadPolicy } from './policies.types.ts';

/** Dated policies of a squad (port and DI token). */
export abstract class PoliciesRepository {
  abstract insert(policy: LoadPolicy & { createdAt: Date }): Promise<void>;
  /** Ends the policy on this day. */
  abstract close(id: string, validTo: string): Promise<void>;
  abstract on(squadId: string, day: string): Promise<LoadPolicy | null>;
  /** Newest first. With `lock` nobody else changes the squad's policies until the unit of work ends. */
  abstract list(squadId: string, options?: { lock?: boolean }): Promise<LoadPolicy[]>;
}
