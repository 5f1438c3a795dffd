import { Injectable } from '@nestjs/common';
import { dayNumber, isoDay, isoWeek as weekOfDay, weekRange } from '../../core/series/day.ts';
import { Clock } from '../../platform/clock.ts';
import { NotFoundError, RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { localDay } from '../../platform/zoned-time.ts';
import { AuditService } from '../access/audit.service.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { ReportMaker } from './report-maker.service.ts';
import { ReportRepository } from './reports.repository.ts';
import { reportFilename } from './report-filename.ts';
import type { NamedReport, ReportMeta, ReportView, StoredReport } from './reports.types.ts';
import { canonicalView, sha256 } from './view-hash.ts';

export interface MadeReport {
  report: NamedReport;
  /** False where the newest version says the same already. */
  created: boolean;
}

/** The record of reports: made once a view, never rewritten; a remake that says something else is a new version. */
@Injectable()
export class ReportsService {
  constructor(
    private readonly reports: ReportRepository,
    private readonly maker: ReportMaker,
    private readonly squads: SquadsService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  /**
   * The report of a squad's ISO week, from what is closed by now. Joins the unit of work under way; two makers of the
   * same week work one after the other, and the second finds the first one's report.
   * @throws {RuleError} for a week that has not begun
   */
  async make(
    squadId: string,
    isoWeek: string,
    options: { change?: string | undefined; madeBy: string | null },
  ): Promise<MadeReport> {
    await this.checkWeek(squadId, isoWeek);
    await this.reports.hold(squadId, isoWeek);
    const newest = await this.reports.newest(squadId, isoWeek);
    const { asOf, view } = await this.maker.view(squadId, isoWeek, await this.viewBefore(squadId, isoWeek));
    const viewHash = sha256(canonicalView(view));
    if (newest !== null && newest.viewHash === viewHash)
      return { report: await this.named(meta(newest)), created: false };
    const version = (newest?.version ?? 0) + 1;
    const change = newest === null ? null : this.change(newest.view, view, options.change);
    const { workbook, mail } = await this.maker.render(view, { version, change });
    const now = this.clock.now();
    const report: StoredReport = {
      id: newId(now),
      squadId,
      isoWeek,
      version,
      asOf,
      change,
      viewHash,
      workbookHash: sha256(workbook),
      madeBy: options.madeBy,
      madeAt: now.toISOString(),
      view,
    };
    await this.reports.insert({ ...report, workbook, mail });
    await this.audit.record('reports.write', 'report', report.id, { squadId, isoWeek, version });
    return { report: await this.named(meta(report)), created: true };
  }

  /** What `make` would say now, without writing anything. */
  async preview(squadId: string, isoWeek: string): Promise<{ view: ReportView; unchanged: boolean; version: number }> {
    await this.checkWeek(squadId, isoWeek);
    const newest = await this.reports.newest(squadId, isoWeek);
    const { view } = await this.maker.view(squadId, isoWeek, await this.viewBefore(squadId, isoWeek));
    const unchanged = newest?.viewHash === sha256(canonicalView(view));
    return { view, unchanged, version: (newest?.version ?? 0) + (unchanged ? 0 : 1) };
  }

  async list(squadId: string): Promise<NamedReport[]> {
    const { name } = await this.squads.squad(squadId);
    const reports = await this.reports.list(squadId);
    return reports.map((report) => ({ ...report, filename: reportFilename(name, report.isoWeek, report.version) }));
  }

  /** @throws {NotFoundError} */
  async report(reportId: string): Promise<NamedReport<StoredReport>> {
    const report = await this.reports.find(reportId);
    if (report === null) throw new NotFoundError();
    return this.named(report);
  }

  /** @throws {NotFoundError} */
  async workbook(reportId: string): Promise<{ filename: string; content: Buffer; hash: string }> {
    const report = await this.report(reportId);
    const content = await this.reports.workbook(reportId);
    if (content === null) throw new NotFoundError();
    return { filename: report.filename, content, hash: report.workbookHash };
  }

  /** Unrounded figures of the newest report of a week, one entry an athlete. @throws {NotFoundError} */
  async measures(squadId: string, isoWeek: string): Promise<unknown[]> {
    const newest = await this.reports.newest(squadId, isoWeek);
    if (newest === null) throw new NotFoundError();
    return this.maker.measures(newest.view);
  }

  private async named<Report extends ReportMeta>(report: Report): Promise<NamedReport<Report>> {
    const { name } = await this.squads.squad(report.squadId);
    return { ...report, filename: reportFilename(name, report.isoWeek, report.version) };
  }

  private change(before: ReportView, after: ReportView, given: string | undefined): string {
    return [given, this.maker.differences(before, after)]
      .filter((part) => part !== undefined && part !== '')
      .join(' · ');
  }

  private async viewBefore(squadId: string, isoWeek: string): Promise<ReportView | null> {
    const before = await this.reports.newest(squadId, weekOfDay(weekRange(isoWeek).from - 1));
    return before?.view ?? null;
  }

  private async checkWeek(squadId: string, isoWeek: string): Promise<void> {
    const { zone } = await this.squads.squad(squadId);
    const today = localDay(this.clock.now(), zone);
    const weekNow = weekOfDay(dayNumber(today));
    if (!/^\d{4}-W\d{2}$/.test(isoWeek) || !exists(isoWeek) || isoDay(weekRange(isoWeek).from) > today) {
      throw new RuleError('There is no such week to report on yet.', [
        { field: 'isoWeek', value: isoWeek, allowed: `an ISO week that exists, at the latest ${weekNow}` },
      ]);
    }
  }
}

function exists(isoWeek: string): boolean {
  try {
    return weekOfDay(weekRange(isoWeek).from) === isoWeek;
  } catch {
    return false;
  }
}

function meta({ view: _, ...rest }: StoredReport): ReportMeta {
  return rest;
}
