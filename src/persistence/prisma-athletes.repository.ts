import { Injectable } from '@nestjs/common';
import { AthletesRepository } from '../features/athletes/athletes.repository.ts';
import type { Athlete, Membership, ZonePeriod } from '../features/athletes/athletes.types.ts';
import { dateOf, dayOf, openDayOf } from './days.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

type Row = Omit<Athlete, 'sex'> & { sex: string | null };

@Injectable()
export class PrismaAthletesRepository extends AthletesRepository {
  async insert(athlete: Athlete & { createdAt: Date }): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().athlete.create({ data: { ...athlete, clubId } });
  }

  async find(id: string): Promise<Athlete | null> {
    const row = await currentTransaction().athlete.findFirst({ where: { id } });
    return row === null ? null : toAthlete(row);
  }

  async list(filter: { squadIds: readonly string[]; day: string } | null): Promise<Athlete[]> {
    const tx = currentTransaction();
    const where = filter === null ? {} : { id: { in: await membersOn(filter) } };
    return (await tx.athlete.findMany({ where, orderBy: [{ name: 'asc' }, { id: 'asc' }] })).map(toAthlete);
  }

  async insertMembership({ from, to, ...membership }: Membership): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().membership.create({
      data: { ...membership, clubId, validFrom: dateOf(from), validTo: to === null ? null : dateOf(to) },
    });
  }

  async memberships(athleteId: string): Promise<Membership[]> {
    const rows = await currentTransaction().membership.findMany({
      where: { athleteId },
      orderBy: { validFrom: 'asc' },
    });
    return rows.map(({ id, squadId, validFrom, validTo }) => ({
      id,
      athleteId,
      squadId,
      from: dayOf(validFrom),
      to: openDayOf(validTo),
    }));
  }

  async endMembership(id: string, to: string): Promise<void> {
    await currentTransaction().membership.updateMany({ where: { id }, data: { validTo: dateOf(to) } });
  }

  async insertZonePeriod({ from, to, ...period }: ZonePeriod): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().zonePeriod.create({
      data: { ...period, clubId, validFrom: dateOf(from), validTo: dateOf(to) },
    });
  }

  async zonePeriods(athleteId: string): Promise<ZonePeriod[]> {
    const rows = await currentTransaction().zonePeriod.findMany({
      where: { athleteId },
      orderBy: { validFrom: 'asc' },
    });
    return rows.map(({ id, zone, validFrom, validTo }) => ({
      id,
      athleteId,
      zone,
      from: dayOf(validFrom),
      to: dayOf(validTo ?? validFrom),
    }));
  }
}

async function membersOn({ squadIds, day }: { squadIds: readonly string[]; day: string }): Promise<string[]> {
  const date = dateOf(day);
  const rows = await currentTransaction().membership.findMany({
    where: {
      squadId: { in: [...squadIds] },
      validFrom: { lte: date },
      OR: [{ validTo: null }, { validTo: { gte: date } }],
    },
    select: { athleteId: true },
  });
  return rows.map(({ athleteId }) => athleteId);
}

function toAthlete({ id, name, sex, birthYear, personId }: Row): Athlete {
  return { id, name, sex: sex === 'female' || sex === 'male' ? sex : null, birthYear, personId };
}
