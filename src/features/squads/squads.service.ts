import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { NotFoundError, RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { AccessService } from '../access/access.service.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { PoliciesService } from '../policies/policies.service.ts';
import { SquadsRepository } from './squads.repository.ts';
import type { SquadInput } from './squads.schema.ts';
import type { Member, MemberStay, Squad, SquadPerson } from './squads.types.ts';

@Injectable()
export class SquadsService {
  constructor(
    private readonly squads: SquadsRepository,
    private readonly policies: PoliciesService,
    private readonly access: AccessService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** A squad is made with its first policy, so that every day of it has one. */
  async add({ name, zone }: SquadInput): Promise<Squad> {
    const now = this.clock.now();
    const squad = { id: newId(now), name, zone };
    await this.squads.insert({ ...squad, createdAt: now });
    await this.policies.addFirst(squad.id);
    await this.audit.record('squads.write', 'squad', squad.id, { zone });
    return squad;
  }

  /** @throws {NotFoundError} */
  async squad(id: string): Promise<Squad> {
    const squad = await this.squads.find(id);
    if (squad === null) throw new NotFoundError();
    return squad;
  }

  /** All squads of the club, or of these the ones that exist; by name. */
  async list(ids?: readonly string[]): Promise<Squad[]> {
    return this.squads.list(ids);
  }

  /** The squads a person may read. */
  async listFor(principal: Principal): Promise<Squad[]> {
    const ids = this.access.squadsFor(principal, 'squads.read');
    return this.squads.list(ids === 'all' ? undefined : ids);
  }

  /** Who is in the squad on this day, by name. */
  async membersOn(squadId: string, day: string): Promise<Member[]> {
    const stays = await this.squads.stays(squadId, day, day);
    return stays.map(({ athleteId, name }) => ({ athleteId, name }));
  }

  /** Every stay in the squad that touches these days: an athlete who left and came back appears twice. */
  async members(squadId: string, from: string, to: string): Promise<MemberStay[]> {
    return this.squads.stays(squadId, from, to);
  }

  /** @throws {RuleError} for an athlete who is not in the squad on any of these days */
  async requireMember(squadId: string, athleteId: string, { from, to }: { from: string; to: string }): Promise<void> {
    const members = await this.members(squadId, from, to);
    if (members.some((member) => member.athleteId === athleteId)) return;
    throw new RuleError('The athlete does not belong to the squad then.', [
      { field: 'athleteId', value: athleteId, allowed: 'an athlete of the squad on these days' },
    ]);
  }

  /** People with the role coach in this squad, or in all of them. */
  async coaches(squadId: string): Promise<SquadPerson[]> {
    return this.squads.coaches(squadId);
  }
}
