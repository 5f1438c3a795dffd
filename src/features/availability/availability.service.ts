import { Injectable } from '@nestjs/common';
import { AccessService } from '../access/access.service.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { AthletesService } from '../athletes/athletes.service.ts';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError, RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { AvailabilityRepository } from './availability.repository.ts';
import type { AvailabilityInput, AvailabilityView } from './availability.schema.ts';
import type { Availability } from './availability.types.ts';

/** Who can train, how and until when; why is the athlete's and the medic's. */
@Injectable()
export class AvailabilityService {
  constructor(
    private readonly entries: AvailabilityRepository,
    private readonly athletes: AthletesService,
    private readonly access: AccessService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add(principal: Principal, athleteId: string, input: AvailabilityInput): Promise<AvailabilityView> {
    await this.refuseBeforeMembership(athleteId, input.from);
    const now = this.clock.now();
    const entry: Availability = {
      id: newId(now),
      athleteId,
      state: input.state,
      cause: input.cause,
      allowedModalities: input.allowedModalities ?? [],
      reason: input.reason ?? null,
      from: input.from,
      to: input.to ?? null,
      enteredBy: principal.personId,
      enteredAt: now,
    };
    refuseOverlap(entry, await this.entries.list(athleteId));
    await this.entries.insert(entry);
    const { from, to } = entry;
    await this.audit.record('availability.add', 'athlete', athleteId, { id: entry.id, from, to });
    return this.present(principal, entry);
  }

  async list(principal: Principal, athleteId: string): Promise<AvailabilityView[]> {
    const entries = await this.entries.list(athleteId);
    return Promise.all(entries.map((entry) => this.present(principal, entry)));
  }

  /** The last day of an entry; an ended one may be ended earlier, not later. */
  async end(principal: Principal, athleteId: string, id: string, to: string): Promise<AvailabilityView> {
    const entry = (await this.entries.list(athleteId)).find((each) => each.id === id);
    if (entry === undefined) throw new NotFoundError();
    if (to < entry.from) {
      throw new RuleError('It ends on or after its first day.', [
        { field: 'to', value: to, allowed: `a date not before ${entry.from}` },
      ]);
    }
    if (entry.to !== null && to > entry.to) {
      throw new ConflictError(`It ended on ${entry.to} already.`, {
        fields: [{ field: 'to', value: to, allowed: `a date up to ${entry.to}` }],
      });
    }
    await this.entries.end(id, to);
    await this.audit.record('availability.end', 'athlete', athleteId, { id, to });
    return this.present(principal, { ...entry, to });
  }

  private async refuseBeforeMembership(athleteId: string, from: string): Promise<void> {
    const [first] = await this.athletes.membership(athleteId);
    if (first !== undefined && from >= first.from) return;
    const allowed = first === undefined ? 'a date within a membership' : `a date not before ${first.from}`;
    throw new RuleError('The athlete did not belong to a squad yet.', [{ field: 'from', value: from, allowed }]);
  }

  /** Everybody who may read it sees that somebody is away; any other cause and the words are health. */
  private async present(principal: Principal, entry: Availability): Promise<AvailabilityView> {
    const health = await this.access.canSeeHealth(principal, entry.athleteId);
    const { id, athleteId, state, cause, reason, allowedModalities, from, to, enteredAt } = entry;
    return {
      ...{ id, athleteId, state, allowedModalities, from, to, enteredAt: enteredAt.toISOString() },
      cause: health || cause === 'away' ? cause : null,
      reason: health ? reason : null,
    };
  }
}

function refuseOverlap({ from, to }: Availability, others: readonly Availability[]): void {
  const other = others.find((each) => (to === null || each.from <= to) && (each.to === null || from <= each.to));
  if (other === undefined) return;
  const span = other.to === null ? `from ${other.from} on` : `from ${other.from} to ${other.to}`;
  throw new ConflictError(`There is an entry ${span} already.`, {
    fields: [{ field: 'from', value: from, allowed: 'days no other entry of the athlete has', hint: 'End it first.' }],
  });
}
