import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { ForbiddenError, NotFoundError } from '../../platform/errors.ts';
import { AccessRepository } from './access.repository.ts';
import { accessTable } from './access-table.ts';
import type { Action } from './access-table.ts';
import type { Principal, Reach, Target } from './access.types.ts';
import { hashToken } from './token.ts';

/** Judges every right, by one table, and refuses what the table does not name. Runs inside the unit of work. */
@Injectable()
export class AccessService {
  constructor(
    private readonly repository: AccessRepository,
    private readonly clock: Clock,
  ) {}

  /** The person whose token this is; null for an unknown, revoked or expired one. */
  async principal(token: string): Promise<Principal | null> {
    return this.repository.principal(hashToken(token), this.clock.now());
  }

  /**
   * @throws {NotFoundError} if the thing is not there or not in sight of the one asking
   * @throws {ForbiddenError} if it is in sight, but the action is not allowed
   */
  async require(principal: Principal, action: Action, target: Target): Promise<void> {
    const reach = await this.reach(target);
    if (reach !== 'club' && reach === null) throw new NotFoundError();
    if (holds(principal, action, reach)) return;
    if (reach === 'club' || inSight(principal, reach)) throw new ForbiddenError();
    throw new NotFoundError();
  }

  async allows(principal: Principal, action: Action, target: Target): Promise<boolean> {
    const reach = await this.reach(target);
    return reach !== null && holds(principal, action, reach);
  }

  /** The squads in which an action is allowed: for lists. */
  squadsFor(principal: Principal, action: Action): 'all' | string[] {
    const grants = principal.roles.filter((grant) => rowsFor(grant.role, action).some(({ scope }) => scope !== 'own'));
    if (grants.some(({ squadId }) => squadId === null)) return 'all';
    return [...new Set(grants.flatMap(({ squadId }) => squadId ?? []))];
  }

  /** Body mass, cause and reason of an availability: the athlete and those who treat them. */
  async canSeeHealth(principal: Principal, athleteId: string): Promise<boolean> {
    return this.allows(principal, 'health.read', { kind: 'athlete', id: athleteId });
  }

  async canWriteHealth(principal: Principal, athleteId: string): Promise<boolean> {
    return this.allows(principal, 'health.write', { kind: 'athlete', id: athleteId });
  }

  private async reach(target: Target): Promise<Reach | 'club' | null> {
    if (target.kind === 'club') return 'club';
    return this.repository.reach(target.kind, target.id, this.clock.now().toISOString().slice(0, 10));
  }
}

function rowsFor(role: string, action: Action) {
  return accessTable.filter((row) => row.role === role && row.action === action);
}

function holds(principal: Principal, action: Action, reach: Reach | 'club'): boolean {
  return principal.roles.some((grant) =>
    rowsFor(grant.role, action).some(({ scope }) => {
      if (scope === 'own') return reach !== 'club' && isOwn(principal, reach);
      if (scope === 'club') return grant.squadId === null;
      return reach === 'club' || grant.squadId === null || reach.squadIds.includes(grant.squadId);
    }),
  );
}

/** In sight: something of one's own, or in a squad one has a role in other than athlete. */
function inSight(principal: Principal, reach: Reach): boolean {
  if (isOwn(principal, reach) || (reach.personId !== null && reach.personId === principal.personId)) return true;
  const isPerson = reach.athleteId === null && reach.personId !== null;
  if (isPerson) return false;
  return principal.roles.some(
    ({ role, squadId }) => role !== 'athlete' && (squadId === null || reach.squadIds.includes(squadId)),
  );
}

function isOwn(principal: Principal, reach: Reach): boolean {
  return principal.athleteId !== null && reach.athleteId === principal.athleteId;
}
