import { Injectable } from '@nestjs/common';
import { AccessRepository } from '../features/access/access.repository.ts';
import { roles } from '../features/access/access.types.ts';
import type { Principal, Reach, RoleGrant, TargetKind } from '../features/access/access.types.ts';
import { reweighScopeSchema } from '../features/sessions/reweigh.schema.ts';
import { currentTransaction } from './prisma-unit-of-work.ts';
import { selectPrincipal } from './sql/select-principal.sql.ts';
import { selectAthleteReach } from './sql/select-athlete-reach.sql.ts';

@Injectable()
export class PrismaAccessRepository extends AccessRepository {
  async principal(tokenHash: Buffer, now: Date): Promise<Principal | null> {
    const row = await selectPrincipal(currentTransaction(), tokenHash, now);
    if (row === null) return null;
    const { clubId, personId, athleteId } = row;
    return { clubId, personId, athleteId, roles: row.roles.filter(isKnownRole) };
  }

  async reach(kind: TargetKind, id: string, today: string): Promise<Reach | null> {
    const tx = currentTransaction();
    switch (kind) {
      case 'squad':
        return squadReach((await tx.squad.findFirst({ where: { id }, select: { id: true } }))?.id);
      case 'report':
        return squadReach((await tx.report.findFirst({ where: { id }, select: { squadId: true } }))?.squadId);
      case 'person': {
        const person = await tx.person.findFirst({ where: { id }, select: { id: true } });
        return person === null ? null : { squadIds: [], athleteId: null, personId: id };
      }
      case 'athlete':
        return selectAthleteReach(tx, id, today);
      case 'session': {
        const session = await tx.trainingSession.findFirst({ where: { id }, select: { athleteId: true } });
        return session === null ? null : selectAthleteReach(tx, session.athleteId, today);
      }
      case 'reweighing': {
        const task = await tx.reweighTask.findFirst({ where: { id }, select: { scope: true } });
        if (task === null) return null;
        const scope = reweighScopeSchema.parse(task.scope);
        return scope.kind === 'policy' ? squadReach(scope.squadId) : selectAthleteReach(tx, scope.athleteId, today);
      }
    }
  }
}

function squadReach(squadId: string | undefined): Reach | null {
  return squadId === undefined ? null : { squadIds: [squadId], athleteId: null, personId: null };
}

function isKnownRole(grant: { role: string; squadId: string | null }): grant is RoleGrant {
  return roles.some((role) => role === grant.role);
}
