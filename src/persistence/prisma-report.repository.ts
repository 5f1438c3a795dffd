import { Injectable } from '@nestjs/common';
import { z } from 'zod';
import { ReportRepository } from '../features/reports/reports.repository.ts';
import type {
  DeliveryState,
  NewReport,
  ReportDelivery,
  ReportMail,
  ReportMeta,
  StoredReport,
} from '../features/reports/reports.types.ts';
import { dateOf, dayOf } from './days.ts';
import type { Prisma, Report, ReportDelivery as DeliveryRow } from './generated/client.ts';
import { currentScope, currentTransaction } from './prisma-unit-of-work.ts';

const view = z.record(z.string(), z.unknown());
const state = z.enum(['waiting', 'sent', 'failed']);

const metaColumns = {
  id: true,
  squadId: true,
  isoWeek: true,
  version: true,
  asOf: true,
  change: true,
  viewHash: true,
  workbookHash: true,
  madeBy: true,
  madeAt: true,
} as const;

@Injectable()
export class PrismaReportRepository extends ReportRepository {
  async hold(squadId: string, isoWeek: string): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().$executeRaw`
      select pg_advisory_xact_lock(hashtextextended(${`report|${clubId}|${squadId}|${isoWeek}`}, 0))`;
  }

  async newest(squadId: string, isoWeek: string): Promise<StoredReport | null> {
    const row = await currentTransaction().report.findFirst({
      where: { squadId, isoWeek },
      orderBy: { version: 'desc' },
      select: { ...metaColumns, view: true },
    });
    return row === null ? null : stored(row);
  }

  async find(reportId: string): Promise<StoredReport | null> {
    const row = await currentTransaction().report.findFirst({
      where: { id: reportId },
      select: { ...metaColumns, view: true },
    });
    return row === null ? null : stored(row);
  }

  async workbook(reportId: string): Promise<Buffer | null> {
    const row = await currentTransaction().report.findFirst({ where: { id: reportId }, select: { workbook: true } });
    return row === null ? null : Buffer.from(row.workbook);
  }

  async mail(reportId: string): Promise<ReportMail | null> {
    const row = await currentTransaction().report.findFirst({
      where: { id: reportId },
      select: { mailSubject: true, mailText: true, mailHtml: true },
    });
    return row === null ? null : { subject: row.mailSubject, text: row.mailText, html: row.mailHtml };
  }

  async list(squadId: string): Promise<ReportMeta[]> {
    const rows = await currentTransaction().report.findMany({
      where: { squadId },
      orderBy: [{ isoWeek: 'desc' }, { version: 'desc' }],
      select: metaColumns,
    });
    return rows.map(meta);
  }

  async insert({ mail, workbook, ...report }: NewReport): Promise<void> {
    await currentTransaction().report.create({
      data: {
        ...report,
        clubId: currentScope().clubId,
        asOf: dateOf(report.asOf),
        madeAt: new Date(report.madeAt),
        view: report.view as Prisma.InputJsonObject,
        workbook: new Uint8Array(workbook),
        mailSubject: mail.subject,
        mailText: mail.text,
        mailHtml: mail.html,
      },
    });
  }

  async addDeliveries(
    deliveries: readonly Pick<ReportDelivery, 'reportId' | 'personId' | 'email' | 'messageId'>[],
  ): Promise<void> {
    const { clubId } = currentScope();
    await currentTransaction().reportDelivery.createMany({
      data: deliveries.map((delivery) => ({ ...delivery, clubId, state: 'waiting' })),
      skipDuplicates: true,
    });
  }

  async deliveries(reportId: string): Promise<ReportDelivery[]> {
    const rows = await currentTransaction().reportDelivery.findMany({
      where: { reportId },
      orderBy: [{ email: 'asc' }, { personId: 'asc' }],
    });
    return rows.map(delivery);
  }

  async lockDelivery(reportId: string, personId: string): Promise<ReportDelivery | null> {
    await currentTransaction().$executeRaw`
      select 1 from report_delivery where report_id = ${reportId}::uuid and person_id = ${personId}::uuid for update`;
    const row = await currentTransaction().reportDelivery.findFirst({ where: { reportId, personId } });
    return row === null ? null : delivery(row);
  }

  async setDelivery(
    reportId: string,
    personId: string,
    next: DeliveryState,
    detail: string,
    sentAt: Date | null,
  ): Promise<void> {
    await currentTransaction().reportDelivery.updateMany({
      where: { reportId, personId },
      data: { state: next, detail, sentAt },
    });
  }
}

function meta(row: Pick<Report, keyof typeof metaColumns>): ReportMeta {
  return { ...row, asOf: dayOf(row.asOf), madeAt: row.madeAt.toISOString() };
}

function stored({ view: json, ...row }: Pick<Report, keyof typeof metaColumns | 'view'>): StoredReport {
  return { ...meta(row), view: view.parse(json) };
}

function delivery(row: DeliveryRow): ReportDelivery {
  const { reportId, personId, email, messageId, detail, sentAt } = row;
  return {
    reportId,
    personId,
    email,
    messageId,
    state: state.parse(row.state),
    detail,
    sentAt: sentAt?.toISOString() ?? null,
  };
}
