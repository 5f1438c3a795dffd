import { Injectable } from '@nestjs/common';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError, PreconditionFailedError, ValidationError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { checkDays, checkExternalIds, externalKey } from './check-days.ts';
import { placeSessions } from './place-sessions.ts';
import { presentSession } from './present-session.ts';
import { groupEntries, sessionEntry } from './session-entry.ts';
import { refuseFaults } from './session-faults.ts';
import { SessionStoreService } from './session-store.service.ts';
import { SessionsRepository } from './sessions.repository.ts';
import type { GroupSessionInput, SessionCorrection, SessionInput, SessionView } from './sessions.schema.ts';
import type { WeighedSession } from './sessions.types.ts';
import { WeigherService } from './weigher.service.ts';

/** Logs, corrects and withdraws sessions. */
@Injectable()
export class SessionsService {
  constructor(
    private readonly sessions: SessionsRepository,
    private readonly storage: SessionStoreService,
    private readonly weigher: WeigherService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async log(principal: Principal, athleteId: string, input: SessionInput): Promise<SessionView> {
    const [session] = await this.storage.store([{ athleteId, entry: sessionEntry(input) }], {
      enteredBy: principal.personId,
      groupId: null,
      refuse: (faults) => refuseFaults(faults, plainName),
    });
    await this.audit.record('sessions.log', 'session', session!.id, { athleteId });
    return presentSession(session!);
  }

  /** One session given to many, each with own rating: all or none. */
  async logForGroup(
    principal: Principal,
    squadId: string,
    input: GroupSessionInput,
  ): Promise<{ groupId: string; items: SessionView[] }> {
    refuseDoubles(input.athletes);
    const groupId = newId(this.clock.now());
    const stored = await this.storage.store(groupEntries(input), {
      enteredBy: principal.personId,
      groupId,
      squadId,
      refuse: (faults) => refuseFaults(faults, (index, field) => `athletes[${index}].${field}`),
    });
    await this.audit.record('sessions.log', 'squad', squadId, { groupId, sessions: stored.map(({ id }) => id) });
    return { groupId, items: stored.map(presentSession) };
  }

  /** Replaces what was entered; the version before is kept with the reason. */
  async correct(
    principal: Principal,
    sessionId: string,
    basedOn: number,
    { changeReason, ...input }: SessionCorrection,
  ): Promise<SessionView> {
    const old = await this.current(sessionId, basedOn);
    const entry = sessionEntry(input);
    const now = this.clock.now();
    const contexts = await this.sessions.athleteContexts([old.athleteId]);
    const { placed, faults } = placeSessions([{ athleteId: old.athleteId, entry }], contexts, { now });
    refuseFaults(faults, plainName);
    const { athlete, day, zone, squadId } = placed[0]!;
    const { athleteId } = old;
    const days = [
      { athleteId, day: old.trainingDay },
      { athleteId, day },
    ];
    await this.sessions.holdForWriting({ squadIds: [squadId], days });
    const weigh = await this.weigher.weigher([athleteId], [squadId]);
    const { judgement, weight } = weigh(athlete, { day, squadId }, entry);
    refuseFaults(
      [
        ...judgement.refused.map((fault) => ({ ...fault, index: 0, kind: 'rule' as const })),
        ...checkDays(placed, await this.sessions.minutesOfDays([{ athleteId, day }], sessionId)),
        ...checkExternalIds(placed, await this.othersExternalIds(old, entry.source, entry.externalId)),
      ],
      plainName,
    );
    const corrected: WeighedSession = {
      ...old,
      ...entry,
      ...{ trainingDay: day, zone, quality: judgement.quality, qualityNotes: judgement.notes },
      ...{ version: old.version + 1, updatedAt: now, weight: { ...weight, weighedAt: now } },
    };
    await this.replace(principal, old, corrected, changeReason);
    await this.sessions.recomputeDays(days);
    return presentSession(corrected);
  }

  /** Takes a session out of every sum; what was entered stays readable with the reason. */
  async withdraw(principal: Principal, sessionId: string, basedOn: number, reason: string): Promise<SessionView> {
    const old = await this.current(sessionId, basedOn);
    const now = this.clock.now();
    const days = [{ athleteId: old.athleteId, day: old.trainingDay }];
    await this.sessions.holdForWriting({ squadIds: [], days });
    const withdrawn: WeighedSession = {
      ...old,
      ...{ version: old.version + 1, updatedAt: now, withdrawnAt: now, withdrawReason: reason, weight: null },
    };
    await this.replace(principal, old, withdrawn, reason);
    await this.sessions.recomputeDays(days);
    return presentSession(withdrawn);
  }

  private async current(sessionId: string, basedOn: number): Promise<WeighedSession> {
    const session = await this.sessions.find(sessionId);
    if (session === null) throw new NotFoundError();
    if (session.version !== basedOn) throw new PreconditionFailedError();
    if (session.withdrawnAt !== null) throw new ConflictError('The session was withdrawn.');
    return session;
  }

  private async replace(principal: Principal, old: WeighedSession, next: WeighedSession, reason: string) {
    // Somebody may have changed it between reading and holding its days.
    if (!(await this.sessions.replace(next, old.version))) throw new PreconditionFailedError();
    const { version } = old;
    const changedAt = next.updatedAt;
    const snapshot = presentSession(old);
    await this.sessions.insertRevision(old.id, { version, snapshot, reason, changedBy: principal.personId, changedAt });
    const what = next.withdrawnAt === null ? 'sessions.correct' : 'sessions.withdraw';
    await this.audit.record(what, 'session', old.id, { version: next.version });
  }

  private async othersExternalIds(old: WeighedSession, source: string, externalId: string | null) {
    if (externalId === null || (old.source === source && old.externalId === externalId)) return new Set<string>();
    const { athleteId } = old;
    const known = await this.sessions.knownExternalIds([{ athleteId, source, externalId }]);
    return new Set([...known].filter((key) => key === externalKey(athleteId, source, externalId)));
  }
}

const plainName = (_: number, field: string) => field;

function refuseDoubles(athletes: readonly { athleteId: string }[]): void {
  const fields = athletes.flatMap(({ athleteId }, index) =>
    athletes.findIndex((other) => other.athleteId === athleteId) < index
      ? [{ field: `athletes[${index}].athleteId`, value: athleteId, allowed: 'each athlete once' }]
      : [],
  );
  if (fields.length > 0) throw new ValidationError(fields);
}
