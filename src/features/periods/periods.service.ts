import { Injectable } from '@nestjs/common';
import { dayNumber } from '../../core/series/day.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { PeriodsRepository } from './periods.repository.ts';
import type { PeriodInput, PeriodView } from './periods.schema.ts';
import type { LoadPeriod } from './periods.types.ts';

/** Longer than this no overload is planned (own convention). */
export const MAX_OVERLOAD_DAYS = 21;

@Injectable()
export class PeriodsService {
  constructor(
    private readonly periods: PeriodsRepository,
    private readonly squads: SquadsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add(principal: Principal, squadId: string, input: PeriodInput): Promise<PeriodView> {
    refuseLongOverload(input);
    if (input.athleteId !== undefined) await this.squads.requireMember(squadId, input.athleteId, input);
    const now = this.clock.now();
    const period: LoadPeriod = {
      id: newId(now),
      squadId,
      athleteId: input.athleteId ?? null,
      purpose: input.purpose,
      from: input.from,
      to: input.to,
      note: input.note ?? null,
      enteredBy: principal.personId,
      enteredAt: now,
    };
    refuseOverlap(period, await this.periods.list(squadId));
    await this.periods.insert(period);
    await this.audit.record('periods.write', 'squad', squadId, { id: period.id, from: period.from, to: period.to });
    return present(period);
  }

  /** Of the squad and its athletes, by first day. */
  async list(squadId: string): Promise<PeriodView[]> {
    return (await this.periods.list(squadId)).map(present);
  }
}

function refuseLongOverload({ purpose, from, to }: PeriodInput): void {
  const days = dayNumber(to) - dayNumber(from) + 1;
  if (purpose !== 'overload' || days <= MAX_OVERLOAD_DAYS) return;
  throw new RuleError(`An overload lasts at most ${MAX_OVERLOAD_DAYS} days; ${days} are given.`, [
    { field: 'to', value: to, allowed: `at most ${MAX_OVERLOAD_DAYS} days together, ${days} are given` },
  ]);
}

function refuseOverlap({ athleteId, from, to }: LoadPeriod, others: readonly LoadPeriod[]): void {
  const other = others.find((each) => each.athleteId === athleteId && each.from <= to && from <= each.to);
  if (other === undefined) return;
  throw new ConflictError(`There is a period (${other.purpose}) from ${other.from} to ${other.to} already.`, {
    fields: [{ field: 'from', value: from, allowed: 'days no other period of the same squad or athlete has' }],
  });
}

function present(period: LoadPeriod): PeriodView {
  return { ...period, enteredAt: period.enteredAt.toISOString() };
}
