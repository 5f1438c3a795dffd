import { Injectable } from '@nestjs/common';
import { PeriodsRepository } from '../features/periods/periods.repository.ts';
import { purposes } from '../features/periods/periods.types.ts';
import type { LoadPeriod } from '../features/periods/periods.types.ts';
import { dateOf, dayOf } from './days.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaPeriodRepository extends PeriodsRepository {
  async insert({ from, to, ...period }: LoadPeriod): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().loadPeriod.create({
      data: { ...period, clubId, validFrom: dateOf(from), validTo: dateOf(to) },
    });
  }

  async list(squadId: string): Promise<LoadPeriod[]> {
    const rows = await currentTransaction().loadPeriod.findMany({
      where: { clubId: currentScope().clubId, squadId },
      orderBy: [{ validFrom: 'asc' }, { id: 'asc' }],
    });
    return rows.map(({ clubId: _, purpose, validFrom, validTo, ...period }) => ({
      ...period,
      purpose: oneOf(purposes, purpose),
      from: dayOf(validFrom),
      to: dayOf(validTo),
    }));
  }
}
