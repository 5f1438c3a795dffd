import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { presentDefinition } from './present-test.ts';
import { TestsRepository } from './tests.repository.ts';
import type { DefinitionInput, DefinitionView } from './tests.schema.ts';
import type { TestDefinition } from './tests.types.ts';

/** The tests a squad does: maximal ones, and the fixed bout of every week. */
@Injectable()
export class TestDefinitionsService {
  constructor(
    private readonly tests: TestsRepository,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add(principal: Principal, squadId: string, input: DefinitionInput): Promise<DefinitionView> {
    const { kind, name, protocol, modality, setting } = input;
    if ((await this.tests.definitions(squadId)).some((other) => other.name === name)) {
      throw new ConflictError('There is a test of that name already.', {
        fields: [{ field: 'name', value: name, allowed: 'a name no other test of the squad has' }],
      });
    }
    const now = this.clock.now();
    const definition: TestDefinition = {
      ...{ id: newId(now), squadId, kind, name, protocol, modality, setting },
      scale:
        input.kind === 'criterion'
          ? { unit: input.unit, direction: input.direction, typicalError: input.typicalError }
          : null,
      ratingTypicalError: input.kind === 'criterion' ? null : input.ratingTypicalError,
      heartRateTypicalError: input.kind === 'criterion' ? null : input.heartRateTypicalError,
      ...{ createdBy: principal.personId, createdAt: now, withdrawnAt: null, withdrawReason: null },
    };
    await this.tests.insertDefinition(definition);
    await this.audit.record('tests.define', 'squad', squadId, { id: definition.id });
    return presentDefinition(definition);
  }

  /** Those that were not withdrawn, by name. */
  async list(squadId: string): Promise<DefinitionView[]> {
    return (await this.tests.definitions(squadId)).map(presentDefinition);
  }

  /** Takes no further results; those it has stay. */
  async withdraw(squadId: string, id: string, reason: string): Promise<DefinitionView> {
    const definition = (await this.tests.definitions(squadId)).find((one) => one.id === id);
    if (definition === undefined) throw new NotFoundError();
    const now = this.clock.now();
    if (!(await this.tests.withdrawDefinition(id, reason, now))) throw new NotFoundError();
    await this.audit.record('tests.withdraw', 'squad', squadId, { id });
    return presentDefinition({ ...definition, withdrawnAt: now, withdrawReason: reason });
  }
}
