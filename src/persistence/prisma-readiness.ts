import { Injectable } from '@nestjs/common';
import { Readiness } from '../platform/readiness.ts';
import type { ReadinessState } from '../platform/readiness.ts';
import { Prisma } from './generated/client.ts';
import { PrismaService } from './prisma.service.ts';

/** Tables are named like their models: TrainingSession is training_session. */
const tables = Object.values(Prisma.ModelName).map((model) =>
  model.replace(/(?<!^)[A-Z]/g, (letter) => `_${letter}`).toLowerCase(),
);

@Injectable()
export class PrismaReadiness extends Readiness {
  constructor(private readonly prisma: PrismaService) {
    super();
  }

  async check(): Promise<ReadinessState> {
    if (!(await this.prisma.isReachable())) return { database: false, schema: false };
    const rows = await this.prisma.client.$queryRaw<{ there: boolean }[]>`
      select to_regclass('public.' || name) is not null as there from unnest(${tables}::text[]) as name`;
    return { database: true, schema: rows.length === tables.length && rows.every(({ there }) => there) };
  }
}
