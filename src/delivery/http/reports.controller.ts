import { Body, Controller, Get, HttpStatus, Param, Post, Res, StreamableFile } from '@nestjs/common';
import { ApiBearerAuth, ApiOperation, ApiProduces, ApiTags } from '@nestjs/swagger';
import type { Principal } from '../../features/access/access.types.ts';
import { ReportDeliveriesService } from '../../features/reports/report-deliveries.service.ts';
import {
  deliveryListSchema,
  reportInputSchema,
  reportListSchema,
  reportMetaSchema,
  reportParamsSchema,
  reportSchema,
  squadReportsParamsSchema,
} from '../../features/reports/reports.schema.ts';
import type { ReportInput } from '../../features/reports/reports.schema.ts';
import { ReportsService } from '../../features/reports/reports.service.ts';
import type { NamedReport } from '../../features/reports/reports.types.ts';
import { Access, CurrentPrincipal } from './access.decorator.ts';
import { Answer } from './answer.decorator.ts';
import type { AppReply } from './request.types.ts';

const XLSX = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';

@ApiTags('reports')
@ApiBearerAuth()
@Controller('v1')
export class ReportsController {
  constructor(
    private readonly reports: ReportsService,
    private readonly deliveries: ReportDeliveriesService,
  ) {}

  @Post('squads/:squadId/reports')
  @ApiOperation({
    summary: 'Makes the report of a week; 200 with the newest version where it says the same already. Mails nothing.',
  })
  @Access('reports.write', { kind: 'squad', param: 'squadId' })
  @Answer(201, reportMetaSchema)
  async make(
    @CurrentPrincipal() { personId }: Principal,
    @Param({ schema: squadReportsParamsSchema }) { squadId }: { squadId: string },
    @Body({ schema: reportInputSchema }) { isoWeek, change }: ReportInput,
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    const { report, created } = await this.reports.make(squadId, isoWeek, { change, madeBy: personId });
    if (!created) void reply.status(HttpStatus.OK);
    return withFiles(report);
  }

  @Get('squads/:squadId/reports')
  @ApiOperation({ summary: 'Reports of the squad, newest first.' })
  @Access('reports.read', { kind: 'squad', param: 'squadId' })
  @Answer(200, reportListSchema)
  async list(@Param({ schema: squadReportsParamsSchema }) { squadId }: { squadId: string }) {
    const reports = await this.reports.list(squadId);
    return { items: reports.map(withFiles) };
  }

  @Get('reports/:reportId')
  @ApiOperation({ summary: 'The record with everything it says, figures unrounded.' })
  @Access('reports.read', { kind: 'report', param: 'reportId' })
  @Answer(200, reportSchema)
  async report(@Param({ schema: reportParamsSchema }) { reportId }: { reportId: string }) {
    const { view, ...report } = await this.reports.report(reportId);
    return { ...withFiles(report), view };
  }

  @Get('reports/:reportId/workbook')
  @ApiOperation({ summary: 'The workbook of a report (.xlsx).' })
  @Access('reports.read', { kind: 'report', param: 'reportId' })
  @ApiProduces(XLSX)
  @Answer(200)
  async workbook(
    @Param({ schema: reportParamsSchema }) { reportId }: { reportId: string },
    @Res({ passthrough: true }) reply: AppReply,
  ) {
    const { filename, content, hash } = await this.reports.workbook(reportId);
    void reply.header('etag', `"${hash}"`).header('cache-control', 'private, no-cache');
    return new StreamableFile(content, { type: XLSX, disposition: `attachment; filename="${filename}"` });
  }

  @Get('reports/:reportId/deliveries')
  @ApiOperation({ summary: 'To whom a report was mailed, and what became of it.' })
  @Access('reports.read', { kind: 'report', param: 'reportId' })
  @Answer(200, deliveryListSchema)
  async delivered(@Param({ schema: reportParamsSchema }) { reportId }: { reportId: string }) {
    return { items: await this.deliveries.deliveries(reportId) };
  }
}

function withFiles<Report extends NamedReport>({ filename, ...report }: Report) {
  return { ...report, files: [{ name: filename, path: `/v1/reports/${report.id}/workbook` }] };
}
