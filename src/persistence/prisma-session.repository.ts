import { Injectable } from '@nestjs/common';
import { SessionsRepository } from '../features/sessions/sessions.repository.ts';
import type { AthleteDay, AthletesPlan, SessionPage, WritingPlan } from '../features/sessions/sessions.repository.ts';
import type {
  AthleteContext,
  SessionRecord,
  SessionRevision,
  StoredWeight,
  WeighedSession,
} from '../features/sessions/sessions.types.ts';
import { dateOf } from './days.ts';
import type { Prisma } from './generated/client.ts';
import type { TrainingSessionModel } from './generated/models.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { toSession, toSessionRow, toWeight, toWeightRow } from './session-rows.ts';
import { holdNames, holdWeighing } from './sql/hold-weighing.sql.ts';
import type { WeighingHold } from './sql/hold-weighing.sql.ts';
import { insertSessions } from './sql/insert-sessions.sql.ts';
import { recomputeDailyTotals } from './sql/recompute-daily-totals.sql.ts';
import { selectAthleteContexts } from './sql/select-athlete-contexts.sql.ts';
import { selectKnownExternalIds } from './sql/select-known-external-ids.sql.ts';
import { selectMinutesOfDays } from './sql/select-minutes-of-days.sql.ts';
import { insertWeights } from './sql/write-weights.sql.ts';

/** With more days of one athlete than this, the whole athlete is held: a server has room for few thousand locks. */
const DAYS_HELD_SINGLY = 7;

@Injectable()
export class PrismaSessionRepository extends SessionsRepository {
  async athleteContexts(athleteIds: readonly string[]): Promise<Map<string, AthleteContext>> {
    const rows = await selectAthleteContexts(currentTransaction(), athleteIds);
    return new Map(
      rows.map((row) => [row.athleteId, { ...row, sex: row.sex === 'female' || row.sex === 'male' ? row.sex : null }]),
    );
  }

  async holdForWriting({ squadIds, days }: WritingPlan): Promise<void> {
    const { clubId } = currentScope();
    const byAthlete = Map.groupBy(days, ({ athleteId }) => athleteId);
    await holdWeighing(currentTransaction(), [
      ...squadHolds(clubId, squadIds),
      ...[...byAthlete].flatMap(([athleteId, own]): WeighingHold[] => {
        const singly = own.length <= DAYS_HELD_SINGLY;
        const athlete: WeighingHold = { level: 2, name: holdNames.athlete(clubId, athleteId), shared: singly };
        if (!singly) return [athlete];
        const daysHeld = own.map(({ day }) => holdNames.day(clubId, athleteId, day));
        return [athlete, ...daysHeld.map((name): WeighingHold => ({ level: 3, name, shared: false }))];
      }),
    ]);
  }

  async holdAthletes({ squadIds, changedSquadId, athleteIds }: AthletesPlan): Promise<void> {
    const { clubId } = currentScope();
    const changed = changedSquadId === null ? [] : [changedSquadId];
    await holdWeighing(currentTransaction(), [
      ...squadHolds(clubId, squadIds),
      ...squadHolds(clubId, changed).map((hold) => ({ ...hold, shared: false })),
      ...athleteIds.map((id): WeighingHold => ({ level: 2, name: holdNames.athlete(clubId, id), shared: false })),
    ]);
  }

  async minutesOfDays(days: readonly AthleteDay[], exceptSessionId?: string): Promise<Map<string, number>> {
    const rows = await selectMinutesOfDays(currentTransaction(), days, exceptSessionId ?? null);
    return new Map(rows.map(({ athleteId, day, minutes }) => [`${athleteId}|${day}`, minutes]));
  }

  async knownExternalIds(
    keys: readonly { athleteId: string; source: string; externalId: string }[],
  ): Promise<Set<string>> {
    const rows = await selectKnownExternalIds(currentTransaction(), keys);
    return new Set(rows.map(({ athleteId, source, externalId }) => `${athleteId}|${source}|${externalId}`));
  }

  async insert(sessions: readonly (SessionRecord & { weight: StoredWeight })[]): Promise<void> {
    const tx = currentTransaction();
    const { clubId } = currentScope();
    const rows = sessions.map(({ weight: _, ...session }) => toSessionRow(clubId, session));
    await insertSessions(tx, rows);
    await insertWeights(
      tx,
      sessions.map(({ id, weight }) => toWeightRow(clubId, id, weight)),
    );
  }

  async replace({ weight, ...session }: WeighedSession, expectedVersion: number): Promise<boolean> {
    const tx = currentTransaction();
    const { clubId } = currentScope();
    const { count } = await tx.trainingSession.updateMany({
      where: { clubId, id: session.id, version: expectedVersion },
      data: toSessionRow(clubId, session),
    });
    if (count === 0) return false;
    const where = { clubId, sessionId: session.id };
    if (weight === null) await tx.sessionWeight.deleteMany({ where });
    else await tx.sessionWeight.updateMany({ where, data: toWeightRow(clubId, session.id, weight) });
    return true;
  }

  async insertRevision(sessionId: string, revision: SessionRevision): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().sessionRevision.create({
      data: { ...revision, clubId, sessionId, snapshot: revision.snapshot as Prisma.InputJsonObject },
    });
  }

  async revisions(sessionId: string): Promise<SessionRevision[]> {
    const rows = await currentTransaction().sessionRevision.findMany({
      where: { clubId: currentScope().clubId, sessionId },
      orderBy: { version: 'asc' },
    });
    return rows.map(({ clubId: _, sessionId: __, ...revision }) => revision);
  }

  async recomputeDays(days: readonly AthleteDay[]): Promise<void> {
    await recomputeDailyTotals(currentTransaction(), days);
  }

  async find(id: string): Promise<WeighedSession | null> {
    const row = await currentTransaction().trainingSession.findFirst({ where: { clubId: currentScope().clubId, id } });
    return row === null ? null : ((await withWeights([row]))[0] ?? null);
  }

  async page({ athleteId, from, to, after, limit }: SessionPage): Promise<WeighedSession[]> {
    const days = {
      ...(from === undefined ? {} : { gte: dateOf(from) }),
      ...(to === undefined ? {} : { lte: dateOf(to) }),
    };
    const behind = after && {
      OR: [{ startedAt: { lt: after.startedAt } }, { startedAt: after.startedAt, id: { lt: after.id } }],
    };
    const rows = await currentTransaction().trainingSession.findMany({
      where: { clubId: currentScope().clubId, athleteId, withdrawnAt: null, trainingDay: days, ...behind },
      orderBy: [{ startedAt: 'desc' }, { id: 'desc' }],
      take: limit,
    });
    return withWeights(rows);
  }
}

/** The weights of these sessions, read in one go; in the sessions' order. */
export async function withWeights(rows: readonly TrainingSessionModel[]): Promise<WeighedSession[]> {
  const weights = await currentTransaction().sessionWeight.findMany({
    where: { clubId: currentScope().clubId, sessionId: { in: rows.map(({ id }) => id) } },
  });
  const bySession = new Map(weights.map((weight) => [weight.sessionId, toWeight(weight)]));
  return rows.map((row) => ({ ...toSession(row), weight: bySession.get(row.id) ?? null }));
}

function squadHolds(clubId: string, squadIds: readonly string[]): WeighingHold[] {
  return squadIds.map((id) => ({ level: 1, name: holdNames.squad(clubId, id), shared: true }));
}
