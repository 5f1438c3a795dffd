import { createHash, randomBytes } from 'node:crypto';

const shape = /^lw\.([A-Za-z0-9_-]{22})\.[A-Za-z0-9_-]{43}$/;

/** A new access token. It names its club, so that the one lookup before anybody is known stays inside that club. */
export function newToken(clubId: string): string {
  const club = Buffer.from(clubId.replaceAll('-', ''), 'hex').toString('base64url');
  return `lw.${club}.${randomBytes(32).toString('base64url')}`;
}

/** What is stored of a token. 256 random bits need no salt and no slow hash. */
export function hashToken(token: string): Buffer {
  return createHash('sha256').update(token).digest();
}

/** The club a token names; null if it does not look like a token. */
export function clubOfToken(token: string): string | null {
  const club = shape.exec(token)?.[1];
  if (club === undefined) return null;
  const hex = Buffer.from(club, 'base64url').toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
