import type { AccessToken } from './tokens.types.ts';

export interface NewToken {
  id: string;
  personId: string;
  label: string;
  tokenHash: Buffer;
  createdAt: Date;
  expiresAt: Date;
}

/** Access tokens of people (port and DI token). */
export abstract class TokensRepository {
  abstract insert(token: NewToken): Promise<void>;
  /** Newest first. */
  abstract list(personId: string): Promise<AccessToken[]>;
  /** False if the person has no such token; revoking again changes nothing. */
  abstract revoke(personId: string, id: string, at: Date): Promise<boolean>;
}
