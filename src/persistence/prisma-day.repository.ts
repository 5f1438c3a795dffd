import { Injectable } from '@nestjs/common';
import { z } from 'zod';
import { DaysRepository } from '../features/days/days.repository.ts';
import type { AthleteDayFacts, DailyTotal, SquadClosing } from '../features/days/days.types.ts';
import { dateOf, dayOf } from './days.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { selectDayFacts } from './sql/select-day-facts.sql.ts';
import type { DayFactsRow } from './sql/select-day-facts.sql.ts';
import { selectFirstDays } from './sql/select-first-days.sql.ts';

const basisMinutesSchema = z.array(
  z.partialRecord(z.enum(['power', 'speed', 'interval', 'minutes', 'heart-rate', 'rating']), z.number()),
);

@Injectable()
export class PrismaDayRepository extends DaysRepository {
  async facts(athleteIds: readonly string[], from: string, to: string): Promise<AthleteDayFacts[]> {
    return (await selectDayFacts(currentTransaction(), athleteIds, from, to)).map(toFacts);
  }

  async firstDays(athleteIds: readonly string[]): Promise<Map<string, string>> {
    const rows = await selectFirstDays(currentTransaction(), athleteIds);
    return new Map(rows.map(({ athleteId, day }) => [athleteId, day]));
  }

  async closedDays(squadIds: readonly string[], from: string, to: string): Promise<Map<string, string[]>> {
    const rows = await currentTransaction().dayClosing.findMany({
      where: { ...own(), squadId: { in: [...squadIds] }, day: { gte: dateOf(from), lte: dateOf(to) } },
      select: { squadId: true, day: true },
      orderBy: { day: 'asc' },
    });
    const bySquad = Map.groupBy(rows, ({ squadId }) => squadId);
    return new Map([...bySquad].map(([squadId, days]) => [squadId, days.map(({ day }) => dayOf(day))]));
  }

  async closings(squadId: string, from: string, to: string): Promise<SquadClosing[]> {
    const tx = currentTransaction();
    const where = { ...own(), squadId, day: { gte: dateOf(from), lte: dateOf(to) } };
    const closed = await tx.dayClosing.findMany({ where, orderBy: { day: 'asc' } });
    const unknown = await tx.dayUnknown.findMany({ where, orderBy: { athleteId: 'asc' } });
    const byDay = Map.groupBy(unknown, ({ day }) => dayOf(day));
    return closed.map(({ day, closedAt, closedBy }) => ({
      squadId,
      day: dayOf(day),
      closedAt: closedAt.toISOString(),
      closedBy,
      unknownAthleteIds: byDay.get(dayOf(day))?.map(({ athleteId }) => athleteId) ?? [],
    }));
  }

  async lastClosedDay(squadId: string, until: string): Promise<string | null> {
    const row = await currentTransaction().dayClosing.findFirst({
      where: { ...own(), squadId, day: { lte: dateOf(until) } },
      orderBy: { day: 'desc' },
      select: { day: true },
    });
    return row === null ? null : dayOf(row.day);
  }

  async close(squadId: string, day: string, closedAt: Date, unknownAthleteIds: readonly string[]): Promise<void> {
    const tx = currentTransaction();
    const { clubId, personId } = currentScope();
    const key = { clubId, squadId, day: dateOf(day) };
    const closing = { closedAt, closedBy: personId };
    await tx.dayClosing.upsert({
      where: { clubId_squadId_day: key },
      create: { ...key, ...closing },
      update: closing,
    });
    // Marks of these athletes for the day from a squad they were in before have no say any more.
    const theirs = { clubId, day: key.day, athleteId: { in: [...unknownAthleteIds] } };
    await tx.dayUnknown.deleteMany({ where: { OR: [key, theirs] } });
    await tx.dayUnknown.createMany({ data: unknownAthleteIds.map((athleteId) => ({ ...key, athleteId })) });
  }

  async reopen(squadId: string, day: string): Promise<boolean> {
    const tx = currentTransaction();
    const where = { ...own(), squadId, day: dateOf(day) };
    await tx.dayUnknown.deleteMany({ where });
    return (await tx.dayClosing.deleteMany({ where })).count > 0;
  }
}

function own() {
  return { clubId: currentScope().clubId };
}

function toFacts(row: DayFactsRow): AthleteDayFacts {
  const { athleteId, memberships, unknownDays } = row;
  const availability = row.availability.map(({ state, ...entry }) => ({
    ...entry,
    state: oneOf(['full', 'modified', 'none'] as const, state),
  }));
  const basisMinutes = basisMinutesSchema.parse(row.basisMinutes ?? []);
  const totals = row.days.map((day, at): DailyTotal => {
    return {
      athleteId,
      day,
      sessions: row.sessions[at]!,
      minutes: row.minutes[at]!,
      ratingLoad: row.ratingLoad[at]!,
      ratingMissing: row.ratingMissing[at]!,
      domainLoad: row.domainLoad[at]!,
      domainMissing: row.domainMissing[at]!,
      moderateMin: row.moderateMin[at]!,
      heavyMin: row.heavyMin[at]!,
      severeMin: row.severeMin[at]!,
      extremeMin: row.extremeMin[at]!,
      applicableMin: row.applicableMin[at]!,
      coveredMin: row.coveredMin[at]!,
      basisMinutes: basisMinutes[at]!,
      suspect: row.suspect[at]!,
    };
  });
  return { athleteId, memberships, availability, unknownDays, totals };
}
