import { Injectable } from '@nestjs/common';
import { ClubsRepository } from '../features/clubs/clubs.repository.ts';
import type { Club } from '../features/clubs/clubs.types.ts';
import { currentTransaction } from './prisma-unit-of-work.ts';
import { holdName } from './sql/hold-name.sql.ts';

@Injectable()
export class PrismaClubsRepository extends ClubsRepository {
  async insert(club: Club & { createdAt: Date }): Promise<void> {
    await currentTransaction().club.create({ data: club });
  }

  async holdKey(externalKey: string): Promise<void> {
    await holdName(currentTransaction(), `club|${externalKey}`);
  }

  async findByKey(externalKey: string): Promise<Club | null> {
    const club = await currentTransaction().club.findUnique({ where: { externalKey } });
    return club === null ? null : { id: club.id, name: club.name, externalKey: club.externalKey };
  }
}
