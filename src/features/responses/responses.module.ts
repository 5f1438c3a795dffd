import { Module } from '@nestjs/common';
import { AccessModule } from '../access/access.module.ts';
import { AthletesModule } from '../athletes/athletes.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { CircumstancesService } from './circumstances.service.ts';
import { MorningsService } from './mornings.service.ts';

@Module({
  imports: [AccessModule, AthletesModule, SquadsModule],
  providers: [CircumstancesService, MorningsService],
  exports: [CircumstancesService, MorningsService],
})
export class ResponsesModule {}
