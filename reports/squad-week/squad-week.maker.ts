import { Injectable } from '@nestjs/common';
import { FlagsService } from '../../src/features/flags/flags.service.ts';
import { ReportMaker } from '../../src/features/reports/report-maker.service.ts';
import type { RenderedReport, ReportEdition, ReportView } from '../../src/features/reports/reports.types.ts';
import { SeriesService } from '../../src/features/series/series.service.ts';
import { SquadsService } from '../../src/features/squads/squads.service.ts';
import { buildView } from './build-view.ts';
import { differences } from './changes.ts';
import { squadWeekMail } from './squad-week.mail.ts';
import { shortDate } from './squad-week.view.ts';
import type { SquadWeekView } from './squad-week.view.ts';

/** The Monday report of a squad. */
@Injectable()
export class SquadWeekMaker extends ReportMaker {
  constructor(
    private readonly squads: SquadsService,
    private readonly series: SeriesService,
    private readonly flags: FlagsService,
  ) {
    super();
  }

  async view(
    squadId: string,
    isoWeek: string,
    previous: ReportView | null,
  ): Promise<{ asOf: string; view: ReportView }> {
    const { id, name, zone } = await this.squads.squad(squadId);
    const { logs, ...week } = await this.series.squadWeek(squadId, isoWeek);
    const until = week.lastDay ?? week.to;
    const flags = await this.flags.judge(squadId, logs, until, week.policy.settings);
    const changes = await this.flags.thresholdChanges([...logs.keys()], week.from, until);
    const thresholdsChanged = new Map<string, string[]>();
    for (const { athleteId, modality, newest } of changes) {
      const words = `${modality} from ${shortDate(newest)}`;
      thresholdsChanged.set(athleteId, [...(thresholdsChanged.get(athleteId) ?? []), words]);
    }
    const view = buildView({ squad: { id, name, zone }, week, flags, thresholdsChanged, previous: read(previous) });
    return { asOf: until, view: { ...view } };
  }

  differences(before: ReportView, after: ReportView): string {
    return differences(read(before)!, read(after)!);
  }

  async render(view: ReportView, edition: ReportEdition): Promise<RenderedReport> {
    const said = read(view)!;
    return { workbook: await workbookOf(said, edition), mail: squadWeekMail(said, edition) };
  }

  measures(view: ReportView): unknown[] {
    return read(view)!.measures;
  }
}

/** What draws and writes workbooks is loaded with the first report: it would take half of the start of a process. */
async function workbookOf(view: SquadWeekView, edition: ReportEdition): Promise<Buffer> {
  const { squadWeekWorkbook } = await import('../workbook/workbook.ts');
  return squadWeekWorkbook(view, edition);
}

/** Only this maker writes these views; the schema number says whether this program can read them. */
function read(view: ReportView | null): SquadWeekView | null {
  if (view === null) return null;
  if (view.schema !== 1) throw new Error(`a report view of schema ${String(view.schema)} cannot be read`);
  return view as unknown as SquadWeekView;
}
