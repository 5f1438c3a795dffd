import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { PeriodsService } from './periods.service.ts';

@Module({ imports: [AccessModule, SquadsModule], providers: [PeriodsService], exports: [PeriodsService] })
export class PeriodsModule {}
