import { Injectable } from '@nestjs/common';
import { AvailabilityRepository } from '../features/availability/availability.repository.ts';
import { causes } from '../features/availability/availability.types.ts';
import type { Availability } from '../features/availability/availability.types.ts';
import { modalities } from '../features/thresholds/thresholds.types.ts';
import { dateOf, dayOf, openDayOf } from './days.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaAvailabilityRepository extends AvailabilityRepository {
  async insert({ from, to, ...entry }: Availability): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().availability.create({
      data: { ...entry, clubId, validFrom: dateOf(from), validTo: to === null ? null : dateOf(to) },
    });
  }

  async list(athleteId: string): Promise<Availability[]> {
    const rows = await currentTransaction().availability.findMany({
      where: { clubId: currentScope().clubId, athleteId },
      orderBy: { validFrom: 'asc' },
    });
    return rows.map(({ clubId: _, state, cause, allowedModalities, validFrom, validTo, ...entry }) => ({
      ...entry,
      state: oneOf(['full', 'modified', 'none'] as const, state),
      cause: oneOf(causes, cause),
      allowedModalities: allowedModalities.map((modality) => oneOf(modalities, modality)),
      from: dayOf(validFrom),
      to: openDayOf(validTo),
    }));
  }

  async end(id: string, to: string): Promise<void> {
    await currentTransaction().availability.updateMany({
      where: { clubId: currentScope().clubId, id },
      data: { validTo: dateOf(to) },
    });
  }
}
