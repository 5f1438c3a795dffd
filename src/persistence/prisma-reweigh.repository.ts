import { Injectable } from '@nestjs/common';
import { ReweighRepository } from '../features/sessions/reweigh.repository.ts';
import type { ReweighScope, ReweighTask } from '../features/sessions/reweigh.repository.ts';
import { reweighScopeSchema } from '../features/sessions/reweigh.schema.ts';
import type { Quality, StoredWeight, WeighedSession } from '../features/sessions/sessions.types.ts';
import { athleteQuantities } from '../features/thresholds/thresholds.types.ts';
import { dateOf } from './days.ts';
import type { Prisma } from './generated/client.ts';
import { oneOf } from './one-of.ts';
import { withWeights } from './prisma-session.repository.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { toWeightRow } from './session-rows.ts';
import { holdName } from './sql/hold-name.sql.ts';
import {
  countReweighCandidates,
  selectReweighCandidates,
  touchedByPolicy,
  touchedByThresholds,
} from './sql/select-reweigh-candidates.sql.ts';
import { updateQualities, updateWeights } from './sql/write-weights.sql.ts';

@Injectable()
export class PrismaReweighRepository extends ReweighRepository {
  async count(scope: ReweighScope): Promise<number> {
    return countReweighCandidates(currentTransaction(), touchedBy(scope));
  }

  async candidates(scope: ReweighScope, options: { after: string | null; limit: number }): Promise<WeighedSession[]> {
    const tx = currentTransaction();
    const ids = await selectReweighCandidates(tx, touchedBy(scope), options);
    return this.sessions(ids);
  }

  private async sessions(ids: readonly string[]): Promise<WeighedSession[]> {
    const rows = await currentTransaction().trainingSession.findMany({
      where: { clubId: currentScope().clubId, id: { in: [...ids] }, withdrawnAt: null },
      orderBy: { id: 'asc' },
    });
    return withWeights(rows);
  }

  async save(
    changed: readonly { sessionId: string; weight: StoredWeight; quality: Quality; qualityNotes: string[] }[],
  ): Promise<void> {
    const tx = currentTransaction();
    const { clubId } = currentScope();
    await updateWeights(
      tx,
      changed.map(({ sessionId, weight }) => toWeightRow(clubId, sessionId, weight)),
    );
    await updateQualities(tx, changed);
  }

  async athletes(scope: ReweighScope): Promise<string[]> {
    if (scope.kind === 'thresholds') return [scope.athleteId];
    const rows = await currentTransaction().membership.findMany({
      where: {
        clubId: currentScope().clubId,
        squadId: scope.squadId,
        OR: [{ validTo: null }, { validTo: { gte: dateOf(scope.from) } }],
      },
      select: { athleteId: true },
      distinct: ['athleteId'],
      orderBy: { athleteId: 'asc' },
    });
    return rows.map(({ athleteId }) => athleteId);
  }

  async holdTask(id: string): Promise<void> {
    await holdName(currentTransaction(), `reweigh|${currentScope().clubId}|${id}`);
  }

  async insertTask({ scope, ...task }: ReweighTask): Promise<string> {
    const { clubId } = currentScope();
    await currentTransaction().reweighTask.create({
      data: { ...task, clubId, scope: scope as unknown as Prisma.InputJsonObject },
    });
    return clubId;
  }

  async task(id: string): Promise<ReweighTask | null> {
    const row = await currentTransaction().reweighTask.findFirst({ where: { clubId: currentScope().clubId, id } });
    if (row === null) return null;
    const { clubId: _, scope, state, ...task } = row;
    return { ...task, scope: reweighScopeSchema.parse(scope), state: oneOf(['waiting', 'running', 'done'], state) };
  }

  async advance(
    id: string,
    {
      touched,
      ...progress
    }: Pick<ReweighTask, 'done' | 'cursor' | 'state' | 'finishedAt'> & { touched: readonly string[] },
  ): Promise<void> {
    await currentTransaction().reweighTask.updateMany({
      where: { clubId: currentScope().clubId, id },
      data: { ...progress, touched: { push: [...touched] } },
    });
  }
}

function touchedBy(scope: ReweighScope): Prisma.Sql {
  return scope.kind === 'thresholds'
    ? touchedByThresholds(scope.athleteId, scope.changes, athleteQuantities)
    : touchedByPolicy(scope.squadId, scope.from);
}
