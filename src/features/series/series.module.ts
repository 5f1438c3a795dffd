import { Module } from '@nestjs/common';
import { AthletesModule } from '../athletes/athletes.module.ts';
import { DaysModule } from '../days/days.module.ts';
import { PoliciesModule } from '../policies/policies.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { SeriesService } from './series.service.ts';

@Module({
  imports: [DaysModule, SquadsModule, PoliciesModule, AthletesModule],
  providers: [SeriesService],
  exports: [SeriesService],
})
export class SeriesModule {}
