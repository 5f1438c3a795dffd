import { Injectable } from '@nestjs/common';
import type { SquadWeekView } from '../reports/squad-week/squad-week.view.ts';
import { ReportDeliveriesService } from '../src/features/reports/report-deliveries.service.ts';
import { ReportsService } from '../src/features/reports/reports.service.ts';
import { SquadsService } from '../src/features/squads/squads.service.ts';
import type { JobKey } from '../src/features/jobs/jobs.types.ts';
import type { JobHandler, JobRun } from './runner/job-handler.ts';

/** Makes the report of a week and mails it to the squad's coaches. */
@Injectable()
export class WeeklyReportJob implements JobHandler {
  readonly id = 'weekly-report';

  constructor(
    private readonly reports: ReportsService,
    private readonly deliveries: ReportDeliveriesService,
    private readonly squads: SquadsService,
  ) {}

  async run({ squadId, period, step }: JobRun): Promise<string> {
    const { report } = await step(() => this.reports.make(squadId, period, { madeBy: null }));
    const { sent, failed } = await this.deliveries.deliver(report.id, step);
    const refused = failed === 0 ? '' : `, ${failed} refused by the mail server`;
    return `Report ${period} version ${report.version}: mailed to ${sent}${refused}.`;
  }

  async preview({ squadId, period }: JobKey): Promise<string[]> {
    const { view, unchanged, version } = await this.reports.preview(squadId, period);
    const coaches = await this.squads.coaches(squadId);
    return [
      unchanged
        ? `Report ${period}: version ${version} is on record and says the same; no new one would be made.`
        : `Report ${period}: version ${version} would be made.`,
      ...flagged(view as unknown as SquadWeekView),
      ...(coaches.length === 0 ? ['No coach of this squad: nobody would get it.'] : []),
      ...coaches.map(({ name, email }) => `to ${name} <${email}>, unless it was sent before`),
    ];
  }
}

function flagged({ athletes }: SquadWeekView): string[] {
  const lines = athletes.filter(({ level }) => level !== 'none');
  if (lines.length === 0) return ['Nobody is flagged.'];
  return lines.map(({ level, name, since, sentence }) => `${level}: ${name}, since ${since ?? '–'}. ${sentence}`);
}
