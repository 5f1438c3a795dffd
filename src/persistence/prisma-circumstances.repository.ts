import { Injectable } from '@nestjs/common';
import { CircumstancesRepository } from '../features/responses/circumstances.repository.ts';
import { circumstanceKinds } from '../features/responses/circumstances.types.ts';
import type { Circumstance } from '../features/responses/circumstances.types.ts';
import { dateOf, dayOf } from './days.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaCircumstancesRepository extends CircumstancesRepository {
  async insert({ from, to, ...circumstance }: Circumstance): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().circumstance.create({
      data: { ...circumstance, clubId, validFrom: dateOf(from), validTo: dateOf(to) },
    });
  }

  async list(squadId: string): Promise<Circumstance[]> {
    const rows = await currentTransaction().circumstance.findMany({
      where: { clubId: currentScope().clubId, squadId, withdrawnAt: null },
      orderBy: [{ validFrom: 'asc' }, { id: 'asc' }],
    });
    return rows.map(({ clubId: _, kind, validFrom, validTo, ...circumstance }) => ({
      ...circumstance,
      kind: oneOf(circumstanceKinds, kind),
      from: dayOf(validFrom),
      to: dayOf(validTo),
    }));
  }

  async withdraw(id: string, reason: string, at: Date): Promise<boolean> {
    const { count } = await currentTransaction().circumstance.updateMany({
      where: { clubId: currentScope().clubId, id, withdrawnAt: null },
      data: { withdrawnAt: at, withdrawReason: reason },
    });
    return count === 1;
  }
}
