import { Injectable } from '@nestjs/common';
import { MorningsRepository } from '../features/responses/mornings.repository.ts';
import { qualities } from '../features/responses/mornings.types.ts';
import type { Morning, MorningRevision } from '../features/responses/mornings.types.ts';
import { dateOf, dayOf } from './days.ts';
import type { Prisma } from './generated/client.ts';
import type { MorningAnswerModel } from './generated/models.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaMorningsRepository extends MorningsRepository {
  async insert({ day, ...morning }: Morning): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().morningAnswer.create({ data: { ...morning, clubId, day: dateOf(day) } });
  }

  async find(athleteId: string, day: string): Promise<Morning | null> {
    const row = await currentTransaction().morningAnswer.findFirst({
      where: { clubId: currentScope().clubId, athleteId, day: dateOf(day), withdrawnAt: null },
    });
    return row === null ? null : morningOf(row);
  }

  async list(athleteIds: readonly string[], from: string, to: string): Promise<Morning[]> {
    const rows = await currentTransaction().morningAnswer.findMany({
      where: {
        ...{ clubId: currentScope().clubId, athleteId: { in: [...athleteIds] }, withdrawnAt: null },
        day: { gte: dateOf(from), lte: dateOf(to) },
      },
      orderBy: [{ athleteId: 'asc' }, { day: 'asc' }],
    });
    return rows.map(morningOf);
  }

  async replace({ day: _, ...morning }: Morning, basedOn: number): Promise<boolean> {
    const { clubId } = currentScope();
    const { count } = await currentTransaction().morningAnswer.updateMany({
      where: { clubId, id: morning.id, version: basedOn },
      data: morning,
    });
    return count === 1;
  }

  async insertRevision(morningId: string, { snapshot, ...revision }: MorningRevision): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().morningRevision.create({
      data: { ...revision, clubId, morningId, snapshot: snapshot as Prisma.InputJsonValue },
    });
  }

  async revisions(athleteId: string, day: string): Promise<MorningRevision[]> {
    const { clubId } = currentScope();
    const mornings = await currentTransaction().morningAnswer.findMany({
      where: { clubId, athleteId, day: dateOf(day) },
      select: { id: true },
    });
    const rows = await currentTransaction().morningRevision.findMany({
      where: { clubId, morningId: { in: mornings.map(({ id }) => id) } },
      orderBy: [{ changedAt: 'asc' }, { version: 'asc' }],
    });
    return rows.map(({ clubId: _, morningId: __, ...revision }) => revision);
  }
}

function morningOf({ clubId: _, day, quality, ...morning }: MorningAnswerModel): Morning {
  return { ...morning, day: dayOf(day), quality: oneOf(qualities, quality) };
}
