import { Module } from '@nestjs/common';
import { SquadWeekModule } from '../../../reports/squad-week/squad-week.module.ts';
import { AccessModule } from '../access/access.module.ts';
import { SquadsModule } from '../squads/squads.module.ts';
import { ReportDeliveriesService } from './report-deliveries.service.ts';
import { ReportsService } from './reports.service.ts';

@Module({
  imports: [SquadWeekModule, AccessModule, SquadsModule],
  providers: [ReportsService, ReportDeliveriesService],
  exports: [ReportsService, ReportDeliveriesService],
})
export class ReportsModule {}
