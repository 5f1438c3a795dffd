import { Module } from '@nestjs/common';
import { FlagsModule } from '../../src/features/flags/flags.module.ts';
import { ReportMaker } from '../../src/features/reports/report-maker.service.ts';
import { SeriesModule } from '../../src/features/series/series.module.ts';
import { SquadsModule } from '../../src/features/squads/squads.module.ts';
import { SquadWeekMaker } from './squad-week.maker.ts';

@Module({
  imports: [SquadsModule, SeriesModule, FlagsModule],
  providers: [{ provide: ReportMaker, useClass: SquadWeekMaker }],
  exports: [ReportMaker],
})
export class SquadWeekModule {}
