import { Inject, Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import type { Env } from '../../platform/env.ts';
import { NotFoundError } from '../../platform/errors.ts';
import { eachDespiteFailures } from '../../platform/mail/each-despite-failures.ts';
import { MailTransport } from '../../platform/mail/mail-transport.ts';
import { ENV } from '../../platform/tokens.ts';
import { SquadsService } from '../squads/squads.service.ts';
import { ReportRepository } from './reports.repository.ts';
import { ReportsService } from './reports.service.ts';
import type { DeliveryCounts, ReportDelivery } from './reports.types.ts';

const XLSX = 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet';

/**
 * Mails a report to the squad's coaches, each once. The rows are committed first; then each mail is its own unit of
 * work: row locked, mail handed over, row marked. A crash between hand-over and commit sends the same mail under the
 * same Message-ID once more, which mail programs show once and the outbox keeps once.
 */
@Injectable()
export class ReportDeliveriesService {
  constructor(
    private readonly reports: ReportRepository,
    private readonly records: ReportsService,
    private readonly squads: SquadsService,
    private readonly mail: MailTransport,
    private readonly clock: Clock,
    @Inject(ENV) private readonly env: Pick<Env, 'MAIL_FROM'>,
  ) {}

  /** Puts every coach of the squad on the report's list. @returns who still waits for it */
  async prepare(reportId: string): Promise<string[]> {
    const { squadId } = await this.records.report(reportId);
    const coaches = await this.squads.coaches(squadId);
    await this.reports.addDeliveries(
      coaches.map(({ personId, email }) => ({
        reportId,
        personId,
        email,
        messageId: messageId(reportId, personId, this.env.MAIL_FROM),
      })),
    );
    const rows = await this.reports.deliveries(reportId);
    return rows.filter(({ state }) => state === 'waiting').map(({ personId }) => personId);
  }

  /**
   * Sends the report to one person on its list, unless that was done. To be called in a unit of work of its own.
   * @throws if the mail server cannot be reached: the row keeps waiting
   */
  async send(reportId: string, personId: string): Promise<ReportDelivery> {
    const row = await this.reports.lockDelivery(reportId, personId);
    if (row === null) throw new NotFoundError();
    if (row.state !== 'waiting') return row;
    const report = await this.records.report(reportId);
    const mail = await this.reports.mail(reportId);
    if (mail === null) throw new NotFoundError();
    const { filename, content } = await this.records.workbook(reportId);
    const receipt = await this.mail.send({
      messageId: row.messageId,
      from: this.env.MAIL_FROM,
      to: [row.email],
      ...mail,
      attachments: [{ filename, content, contentType: XLSX }],
      date: new Date(report.madeAt),
    });
    const state = receipt.accepted ? 'sent' : 'failed';
    const sentAt = receipt.accepted ? this.clock.now() : null;
    await this.reports.setDelivery(reportId, personId, state, receipt.detail, sentAt);
    return { ...row, state, detail: receipt.detail, sentAt: sentAt?.toISOString() ?? null };
  }

  /** @throws {NotFoundError} */
  async deliveries(reportId: string): Promise<ReportDelivery[]> {
    await this.records.report(reportId);
    return this.reports.deliveries(reportId);
  }

  /**
   * Prepares and sends, each in a unit of work that `inUnit` opens: `(work) => unitOfWork.run(scope, work)`, or the step
   * of a job. Safe to call again after any crash.
   * @throws {UnavailableError} after all were tried, if the mail server would not take some of them now
   */
  async deliver(reportId: string, inUnit: <T>(work: () => Promise<T>) => Promise<T>): Promise<DeliveryCounts> {
    const waiting = await inUnit(() => this.prepare(reportId));
    await eachDespiteFailures(waiting, (personId) => inUnit(() => this.send(reportId, personId)));
    const rows = await inUnit(() => this.reports.deliveries(reportId));
    const count = (state: string): number => rows.filter((row) => row.state === state).length;
    return { waiting: count('waiting'), sent: count('sent'), failed: count('failed') };
  }
}

/** The same report to the same person always has the same Message-ID. */
export function messageId(reportId: string, personId: string, from: string): string {
  const domain = /@([A-Za-z0-9.-]+)/.exec(from)?.[1] ?? 'loadweir.invalid';
  return `<report.${reportId}.${personId}@${domain}>`;
}
