import { Injectable } from '@nestjs/common';
import { SquadsRepository } from '../features/squads/squads.repository.ts';
import type { MemberStay, Squad, SquadPerson } from '../features/squads/squads.types.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

const shown = { id: true, name: true, zone: true } as const;

@Injectable()
export class PrismaSquadsRepository extends SquadsRepository {
  async insert(squad: Squad & { createdAt: Date }): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().squad.create({ data: { ...squad, clubId } });
  }

  async find(id: string): Promise<Squad | null> {
    return currentTransaction().squad.findFirst({ where: { id }, select: shown });
  }

  async list(ids?: readonly string[]): Promise<Squad[]> {
    return currentTransaction().squad.findMany({
      ...(ids === undefined ? {} : { where: { id: { in: [...ids] } } }),
      select: shown,
      orderBy: { name: 'asc' },
    });
  }

  async stays(squadId: string, from: string, to: string): Promise<MemberStay[]> {
    return currentTransaction().$queryRaw<MemberStay[]>`
      select a.id as "athleteId", a.name, m.valid_from::text as "from", m.valid_to::text as "to"
      from membership m join athlete a on a.club_id = m.club_id and a.id = m.athlete_id
      where m.squad_id = ${squadId}::uuid
        and daterange(m.valid_from, m.valid_to, '[]') && daterange(${from}::date, ${to}::date, '[]')
      order by a.name, a.id, m.valid_from`;
  }

  async coaches(squadId: string): Promise<SquadPerson[]> {
    return currentTransaction().$queryRaw<SquadPerson[]>`
      select p.id as "personId", p.name, p.email from person p
      where exists (
        select from role_assignment r where r.club_id = p.club_id and r.person_id = p.id and r.role = 'coach'
          and (r.squad_id is null or r.squad_id = ${squadId}::uuid)
      )
      order by p.name, p.id`;
  }
}
