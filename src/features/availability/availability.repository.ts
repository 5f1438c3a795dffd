import type { Availability } from './availability.types.ts';

/** Stretches of availability (port and DI token). */
export abstract class AvailabilityRepository {
  abstract insert(entry: Availability): Promise<void>;
  /** By first day. */
  abstract list(athleteId: string): Promise<Availability[]>;
  abstract end(id: string, to: string): Promise<void>;
}
