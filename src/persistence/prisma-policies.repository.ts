import { Injectable } from '@nestjs/common';
import { PoliciesRepository } from '../features/policies/policies.repository.ts';
import { policySettingsSchema } from '../features/policies/policies.schema.ts';
import type { LoadPolicy, LoadPolicySettings } from '../features/policies/policies.types.ts';
import { dateOf, dayOf, openDayOf } from './days.ts';
import type { Prisma } from './generated/client.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';
import { holdName } from './sql/hold-name.sql.ts';

@Injectable()
export class PrismaPoliciesRepository extends PoliciesRepository {
  async insert({ validFrom, validTo, settings, ...policy }: LoadPolicy & { createdAt: Date }): Promise<void> {
    const { clubId, personId } = currentScope();
    await currentTransaction().loadPolicy.create({
      data: {
        ...policy,
        clubId,
        createdBy: personId,
        validFrom: dateOf(validFrom),
        validTo: validTo === null ? null : dateOf(validTo),
        settings: settings as unknown as Prisma.InputJsonObject,
      },
    });
  }

  async close(id: string, validTo: string): Promise<void> {
    await currentTransaction().loadPolicy.updateMany({ where: { id }, data: { validTo: dateOf(validTo) } });
  }

  async on(squadId: string, day: string): Promise<LoadPolicy | null> {
    const date = dateOf(day);
    const row = await currentTransaction().loadPolicy.findFirst({
      where: { squadId, validFrom: { lte: date }, OR: [{ validTo: null }, { validTo: { gte: date } }] },
    });
    return row === null ? null : toPolicy(row);
  }

  async list(squadId: string, { lock = false } = {}): Promise<LoadPolicy[]> {
    const tx = currentTransaction();
    if (lock) await holdName(tx, `policies|${currentScope().clubId}|${squadId}`);
    const rows = await tx.loadPolicy.findMany({ where: { squadId }, orderBy: { validFrom: 'desc' } });
    return rows.map(toPolicy);
  }
}

function toPolicy(row: {
  id: string;
  squadId: string;
  validFrom: Date;
  validTo: Date | null;
  settings: unknown;
}): LoadPolicy {
  return {
    id: row.id,
    squadId: row.squadId,
    validFrom: dayOf(row.validFrom),
    validTo: openDayOf(row.validTo),
    settings: policySettingsSchema.parse(row.settings) as LoadPolicySettings,
  };
}
