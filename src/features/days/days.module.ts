import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { DaysService } from './days.service.ts';

@Module({ imports: [AccessModule, SquadsModule], providers: [DaysService], exports: [DaysService] })
export class DaysModule {}
