import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError, RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { AccessService } from '../access/access.service.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { SquadsService } from '../squads/squads.service.ts';
import type { Squad } from '../squads/squads.types.ts';
import { AthletesRepository } from './athletes.repository.ts';
import type { AthleteInput, MembershipInput, ZonePeriodInput } from './athletes.schema.ts';
import type { Athlete, Membership, ZonePeriod } from './athletes.types.ts';
import { zoneAt } from './zone-on.ts';

@Injectable()
export class AthletesService {
  constructor(
    private readonly athletes: AthletesRepository,
    private readonly squads: SquadsService,
    private readonly access: AccessService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /** @throws {NotFoundError} */
  async athlete(id: string): Promise<Athlete> {
    const athlete = await this.athletes.find(id);
    if (athlete === null) throw new NotFoundError();
    return athlete;
  }

  /** The athlete's zone at an instant or on a day: that of a zone period, else of the squad, else of the nearest one. */
  async zoneOn(athleteId: string, at: string | Date): Promise<string> {
    const [periods, memberships] = [
      await this.athletes.zonePeriods(athleteId),
      await this.athletes.memberships(athleteId),
    ];
    const squads = await this.squads.list(memberships.map(({ squadId }) => squadId));
    const zones = new Map(squads.map(({ id, zone }) => [id, zone]));
    const stays = memberships.map(({ squadId, from, to }) => ({ from, to, zone: zones.get(squadId)! }));
    const zone = zoneAt(periods, stays, at);
    if (zone === null) throw new NotFoundError();
    return zone;
  }

  /** The squad the athlete is in on a day; null where in none. */
  async squadOn(athleteId: string, day: string): Promise<Squad | null> {
    const memberships = await this.athletes.memberships(athleteId);
    const current = memberships.find(({ from, to }) => from <= day && (to === null || day <= to));
    return current === undefined ? null : this.squads.squad(current.squadId);
  }

  /** Every stay of the athlete in a squad, by first day. */
  async membership(athleteId: string): Promise<Membership[]> {
    return this.athletes.memberships(athleteId);
  }

  /** Athletes of one squad today, or of every squad the person may read. */
  async list(principal: Principal, squadId?: string): Promise<Athlete[]> {
    if (squadId !== undefined) {
      await this.access.require(principal, 'athletes.read', { kind: 'squad', id: squadId });
      const { zone } = await this.squads.squad(squadId);
      return this.athletes.list({ squadIds: [squadId], day: localDay(this.clock.now(), zone) });
    }
    const squadIds = this.access.squadsFor(principal, 'athletes.read');
    if (squadIds === 'all') return this.athletes.list(null);
    return this.athletes.list({ squadIds, day: localDay(this.clock.now(), 'UTC') });
  }

  async add(principal: Principal, { squadId, memberFrom, ...input }: AthleteInput): Promise<Athlete> {
    await this.requireSquad(principal, squadId);
    const now = this.clock.now();
    const athlete: Athlete = {
      id: newId(now),
      name: input.name,
      sex: input.sex ?? null,
      birthYear: input.birthYear ?? null,
      personId: input.personId ?? null,
    };
    await this.athletes.insert({ ...athlete, createdAt: now });
    await this.insertMembership({ id: newId(now), athleteId: athlete.id, squadId, from: memberFrom, to: null });
    await this.audit.record('athletes.write', 'athlete', athlete.id, { squadId, memberFrom });
    return athlete;
  }

  async addMembership(principal: Principal, athleteId: string, input: MembershipInput): Promise<Membership> {
    await this.requireSquad(principal, input.squadId);
    const { squadId, from, to } = input;
    const membership = { id: newId(this.clock.now()), athleteId, squadId, from, to: to ?? null };
    await this.insertMembership(membership);
    return membership;
  }

  /** The last day of a stay; an ended one may be ended earlier, not later. */
  async endMembership(athleteId: string, membershipId: string, to: string): Promise<Membership> {
    const membership = (await this.athletes.memberships(athleteId)).find(({ id }) => id === membershipId);
    if (membership === undefined) throw new NotFoundError();
    if (to < membership.from) {
      throw new RuleError('A stay ends on or after its first day.', [
        { field: 'to', value: to, allowed: `a date not before ${membership.from}` },
      ]);
    }
    if (membership.to !== null && to > membership.to) throw new ConflictError(`It ended on ${membership.to} already.`);
    await this.athletes.endMembership(membershipId, to);
    await this.audit.record('athletes.write', 'membership', membershipId, { athleteId, to });
    return { ...membership, to };
  }

  async addZonePeriod(athleteId: string, { zone, from, to }: ZonePeriodInput): Promise<ZonePeriod> {
    const period = { id: newId(this.clock.now()), athleteId, zone, from, to };
    await this.athletes.insertZonePeriod(period);
    await this.audit.record('athletes.write', 'zone-period', period.id, { athleteId, zone, from, to });
    return period;
  }

  async zonePeriods(athleteId: string): Promise<ZonePeriod[]> {
    return this.athletes.zonePeriods(athleteId);
  }

  private async insertMembership(membership: Membership): Promise<void> {
    await this.athletes.insertMembership(membership);
    const { athleteId, squadId, from, to } = membership;
    await this.audit.record('athletes.write', 'membership', membership.id, { athleteId, squadId, from, to });
  }

  /** The squad stands in the body, so the route's own rule has not seen it. */
  private async requireSquad(principal: Principal, squadId: string): Promise<void> {
    await this.access.require(principal, 'athletes.write', { kind: 'squad', id: squadId });
  }
}
