import { Injectable } from '@nestjs/common';
import { NotFoundError, ValidationError } from '../../platform/errors.ts';
import { presentSession } from './present-session.ts';
import { SessionsRepository } from './sessions.repository.ts';
import type { SessionQuery, SessionView } from './sessions.schema.ts';
import { readCursor, writeCursor } from './session-cursor.ts';

/** Reads sessions and their history. */
@Injectable()
export class SessionReadingService {
  constructor(private readonly sessions: SessionsRepository) {}

  /** @throws {NotFoundError} */
  async session(id: string): Promise<SessionView> {
    const session = await this.sessions.find(id);
    if (session === null) throw new NotFoundError();
    return presentSession(session);
  }

  /** Live sessions by training day, newest start first. */
  async page(athleteId: string, { from, to, cursor, limit = 50 }: SessionQuery) {
    if (from !== undefined && to !== undefined && to < from) {
      throw new ValidationError([{ field: 'to', value: to, allowed: `a date not before ${from}` }]);
    }
    const after = cursor === undefined ? undefined : readCursor(cursor);
    const found = await this.sessions.page({ athleteId, from, to, after, limit: limit + 1 });
    const last = found.length > limit ? found[limit - 1] : undefined;
    const items = found.slice(0, limit).map(presentSession);
    return { items, nextCursor: last === undefined ? null : writeCursor(last) };
  }

  /** Every version, the oldest first; the last one stands. */
  async history(id: string) {
    const session = await this.session(id);
    const earlier = await this.sessions.revisions(id);
    const items = [
      ...earlier.map(({ changedAt, ...revision }) => ({ ...revision, changedAt: changedAt.toISOString() })),
      { version: session.version, snapshot: session, reason: null, changedBy: null, changedAt: session.updatedAt },
    ];
    return { items };
  }
}
