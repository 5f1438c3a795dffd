import { AsyncLocalStorage } from 'node:async_hooks';
import { Injectable } from '@nestjs/common';
import { UnitOfWork } from '../platform/unit-of-work.ts';
import type { WorkScope } from '../platform/unit-of-work.ts';
import { translateDatabaseError } from './constraint-errors.ts';
import type { Prisma } from './generated/client.ts';
import { PrismaService } from './prisma.service.ts';

interface Running {
  tx: Prisma.TransactionClient;
  /** Null while the operator works outside every club. */
  scope: WorkScope | null;
  operator: boolean;
  open: boolean;
}

const running = new AsyncLocalStorage<Running>();
const limits = { maxWait: 10_000, timeout: 60_000 };

/** The transaction of the unit of work under way. Throws outside one, and after it has ended. */
export function currentTransaction(): Prisma.TransactionClient {
  return current('a repository was called').tx;
}

/** For whom the unit of work under way runs. Throws outside one and while the operator is in no club. */
export function currentScope(): WorkScope {
  const { scope } = current('the scope was asked for');
  if (scope === null) throw new Error('the operator is in no club here');
  return scope;
}

function current(what: string): Running {
  const unit = running.getStore();
  if (unit === undefined) throw new Error(`${what} outside a unit of work`);
  if (!unit.open) throw new Error(`${what} after its unit of work had ended: something was not awaited`);
  return unit;
}

@Injectable()
export class PrismaUnitOfWork extends UnitOfWork {
  constructor(private readonly prisma: PrismaService) {
    super();
  }

  async run<T>(scope: WorkScope, work: () => Promise<T>): Promise<T> {
    const outer = running.getStore();
    if (outer === undefined || !outer.open) return this.begin({ scope, operator: false }, work);
    if (outer.scope === null) return enterClub(outer, scope, work);
    if (outer.scope.clubId !== scope.clubId) throw new Error('a unit of work cannot reach into a second club');
    if (scope.personId === null || scope.personId === outer.scope.personId) return work();
    if (outer.scope.personId !== null) throw new Error('a unit of work cannot change the person it runs for');
    return inside({ ...outer, scope }, work);
  }

  async runAsOperator<T>(work: () => Promise<T>): Promise<T> {
    const outer = running.getStore();
    if (outer === undefined || !outer.open) return this.begin({ scope: null, operator: true }, work);
    if (!outer.operator || outer.scope !== null) throw new Error('a unit of work of a club cannot become the operator');
    return work();
  }

  private async begin<T>(unit: Pick<Running, 'scope' | 'operator'>, work: () => Promise<T>): Promise<T> {
    try {
      return await this.prisma.client.$transaction(async (tx) => {
        await tx.$queryRaw`select set_config('loadweir.club_id', ${unit.scope?.clubId ?? ''}, true),
          set_config('loadweir.operator', ${unit.operator ? 'on' : ''}, true)`;
        return inside({ ...unit, tx, open: true }, work);
      }, limits);
    } catch (error) {
      throw translateDatabaseError(error);
    }
  }
}

async function inside<T>(unit: Running, work: () => Promise<T>): Promise<T> {
  try {
    return await running.run(unit, work);
  } finally {
    unit.open = false;
  }
}

/** The operator's transaction looks at one club for a while. */
async function enterClub<T>(outer: Running, scope: WorkScope, work: () => Promise<T>): Promise<T> {
  const { tx } = outer;
  await tx.$queryRaw`select set_config('loadweir.club_id', ${scope.clubId}, true)`;
  let result: T;
  try {
    result = await inside({ tx, scope, operator: true, open: true }, work);
  } catch (error) {
    // After a database error the transaction is lost and with it the setting; otherwise it is taken back here.
    await leaveClub(tx).catch(() => undefined);
    throw error;
  }
  await leaveClub(tx);
  return result;
}

async function leaveClub(tx: Prisma.TransactionClient): Promise<void> {
  await tx.$queryRaw`select set_config('loadweir.club_id', '', true)`;
}
