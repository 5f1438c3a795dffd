import { Injectable } from '@nestjs/common';
import { ThresholdsRepository } from '../features/thresholds/thresholds.repository.ts';
import { modalities, quantities, settings } from '../features/thresholds/thresholds.types.ts';
import type { ThresholdValue } from '../features/thresholds/thresholds.types.ts';
import { dateOf, dayOf, openDayOf } from './days.ts';
import type { ThresholdValueModel } from './generated/models.ts';
import { oneOf } from './one-of.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { holdNames, holdWeighing } from './sql/hold-weighing.sql.ts';
import { updateThresholdEnds } from './sql/update-threshold-ends.sql.ts';

@Injectable()
export class PrismaThresholdRepository extends ThresholdsRepository {
  async list(athleteIds: readonly string[]): Promise<ThresholdValue[]> {
    const rows = await currentTransaction().thresholdValue.findMany({
      where: { clubId: currentScope().clubId, athleteId: { in: [...athleteIds] } },
      orderBy: [{ quantity: 'asc' }, { validFrom: 'asc' }, { enteredAt: 'asc' }, { id: 'asc' }],
    });
    return rows.map(toValue);
  }

  async lockForChange(athleteId: string): Promise<void> {
    const tx = currentTransaction();
    const { clubId } = currentScope();
    const squads = await tx.membership.findMany({ where: { athleteId }, select: { squadId: true } });
    await holdWeighing(tx, [
      ...squads.map(({ squadId }) => ({ level: 1 as const, name: holdNames.squad(clubId, squadId), shared: true })),
      { level: 2, name: holdNames.athlete(clubId, athleteId), shared: false },
    ]);
  }

  async save(before: readonly ThresholdValue[], after: readonly ThresholdValue[]): Promise<void> {
    const tx = currentTransaction();
    const { clubId } = currentScope();
    const known = new Map(before.map((value) => [value.id, value]));
    const added = after.filter(({ id }) => !known.has(id));
    const changed = after.filter((value) => {
      const was = known.get(value.id);
      return was !== undefined && (was.validTo !== value.validTo || was.withdrawnAt !== value.withdrawnAt);
    });
    await tx.$executeRaw`set constraints threshold_value_no_overlap deferred`;
    await updateThresholdEnds(tx, changed);
    if (added.length > 0) {
      await tx.thresholdValue.createMany({
        data: added.map(({ validFrom, validTo, ...value }) => ({
          ...value,
          clubId,
          validFrom: dateOf(validFrom),
          validTo: validTo === null ? null : dateOf(validTo),
        })),
      });
    }
    await tx.$executeRaw`set constraints threshold_value_no_overlap immediate`;
  }
}

function toValue(row: ThresholdValueModel): ThresholdValue {
  const { clubId: _, quantity, modality, setting, validFrom, validTo, ...value } = row;
  return {
    ...value,
    quantity: oneOf(quantities, quantity),
    modality: oneOf(modalities, modality),
    setting: oneOf(settings, setting),
    validFrom: dayOf(validFrom),
    validTo: openDayOf(validTo),
  };
}
