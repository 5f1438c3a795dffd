import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { AthletesService } from './athletes.service.ts';

@Module({ imports: [AccessModule, SquadsModule], providers: [AthletesService], exports: [AthletesService] })
export class AthletesModule {}
