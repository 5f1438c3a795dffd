import { Injectable } from '@nestjs/common';
import { TestsRepository } from '../features/tests/tests.repository.ts';
import { directions, resultQualities, testKinds } from '../features/tests/tests.types.ts';
import type { TestDefinition, TestResult } from '../features/tests/tests.types.ts';
import { modalities, settings } from '../features/thresholds/thresholds.types.ts';
import { dateOf, dayOf } from './days.ts';
import type { TestDefinitionModel } from './generated/models.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

@Injectable()
export class PrismaTestsRepository extends TestsRepository {
  async insertDefinition({ scale, ...definition }: TestDefinition): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().testDefinition.create({ data: { ...definition, ...scale, clubId } });
  }

  async definitions(squadId: string): Promise<TestDefinition[]> {
    const rows = await currentTransaction().testDefinition.findMany({
      where: { clubId: currentScope().clubId, squadId, withdrawnAt: null },
      orderBy: { name: 'asc' },
    });
    return rows.map(definitionOf);
  }

  async definitionsById(ids: readonly string[]): Promise<TestDefinition[]> {
    const rows = await currentTransaction().testDefinition.findMany({
      where: { clubId: currentScope().clubId, id: { in: [...ids] } },
    });
    return rows.map(definitionOf);
  }

  async withdrawDefinition(id: string, reason: string, at: Date): Promise<boolean> {
    const { count } = await currentTransaction().testDefinition.updateMany({
      where: { clubId: currentScope().clubId, id, withdrawnAt: null },
      data: { withdrawnAt: at, withdrawReason: reason },
    });
    return count === 1;
  }

  async insertResult({ day, ...result }: TestResult): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().testResult.create({ data: { ...result, clubId, day: dateOf(day) } });
  }

  async results(athleteIds: readonly string[]): Promise<TestResult[]> {
    const rows = await currentTransaction().testResult.findMany({
      where: { clubId: currentScope().clubId, athleteId: { in: [...athleteIds] }, withdrawnAt: null },
      orderBy: [{ athleteId: 'asc' }, { day: 'asc' }, { id: 'asc' }],
    });
    return rows.map(({ clubId: _, day, quality, ...result }) => ({
      ...result,
      day: dayOf(day),
      quality: oneOf(resultQualities, quality),
    }));
  }

  async withdrawResult(id: string, by: string | null, reason: string, at: Date): Promise<boolean> {
    const { count } = await currentTransaction().testResult.updateMany({
      where: { clubId: currentScope().clubId, id, withdrawnAt: null },
      data: { withdrawnAt: at, withdrawnBy: by, withdrawReason: reason },
    });
    return count === 1;
  }
}

function definitionOf({ clubId: _, unit, direction, typicalError, ...row }: TestDefinitionModel): TestDefinition {
  return {
    ...row,
    kind: oneOf(testKinds, row.kind),
    modality: oneOf(modalities, row.modality),
    setting: oneOf(settings, row.setting),
    scale:
      unit === null || direction === null || typicalError === null
        ? null
        : { unit, direction: oneOf(directions, direction), typicalError },
  };
}
