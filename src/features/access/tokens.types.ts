/** An access token as it is listed: without its secret. */
export interface AccessToken {
  id: string;
  personId: string;
  label: string;
  createdAt: string;
  expiresAt: string;
  revokedAt: string | null;
}

/** An access token when it is made: the only time its secret is known. */
export interface IssuedToken {
  id: string;
  label: string;
  secret: string;
  expiresAt: string;
}
