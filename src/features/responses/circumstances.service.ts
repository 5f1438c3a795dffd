import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { CircumstancesRepository } from './circumstances.repository.ts';
import type { CircumstanceInput, CircumstanceView } from './circumstances.schema.ts';
import type { Circumstance } from './circumstances.types.ts';

/** Travel, heat and altitude of a squad or of one of its athletes. */
@Injectable()
export class CircumstancesService {
  constructor(
    private readonly circumstances: CircumstancesRepository,
    private readonly squads: SquadsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add(principal: Principal, squadId: string, input: CircumstanceInput): Promise<CircumstanceView> {
    const { kind, from, to, athleteId = null, note = null } = input;
    if (athleteId !== null) await this.squads.requireMember(squadId, athleteId, input);
    const now = this.clock.now();
    const circumstance: Circumstance = {
      ...{ id: newId(now), squadId, athleteId, kind, from, to, note },
      ...{ enteredBy: principal.personId, enteredAt: now, withdrawnAt: null, withdrawReason: null },
    };
    await this.circumstances.insert(circumstance);
    await this.audit.record('circumstances.add', 'squad', squadId, { id: circumstance.id, from, to });
    return present(circumstance);
  }

  /** Of the squad and its athletes, by first day. */
  async list(squadId: string): Promise<CircumstanceView[]> {
    return (await this.of(squadId)).map(present);
  }

  async of(squadId: string): Promise<Circumstance[]> {
    return this.circumstances.list(squadId);
  }

  async withdraw(squadId: string, id: string, reason: string): Promise<CircumstanceView> {
    const circumstance = (await this.circumstances.list(squadId)).find((one) => one.id === id);
    if (circumstance === undefined) throw new NotFoundError();
    const now = this.clock.now();
    if (!(await this.circumstances.withdraw(id, reason, now))) throw new NotFoundError();
    await this.audit.record('circumstances.withdraw', 'squad', squadId, { id });
    return present({ ...circumstance, withdrawnAt: now, withdrawReason: reason });
  }
}

function present({ enteredAt, withdrawnAt, ...circumstance }: Circumstance): CircumstanceView {
  return {
    ...circumstance,
    enteredAt: enteredAt.toISOString(),
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
  };
}
