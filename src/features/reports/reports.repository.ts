import type {
  DeliveryState,
  NewReport,
  ReportDelivery,
  ReportMail,
  ReportMeta,
  StoredReport,
} from './reports.types.ts';

/** Reports on record and their deliveries (port and DI token). */
export abstract class ReportRepository {
  /** Holds the squad's week until the unit of work ends: makers of the same report work one after the other. */
  abstract hold(squadId: string, isoWeek: string): Promise<void>;
  abstract newest(squadId: string, isoWeek: string): Promise<StoredReport | null>;
  abstract find(reportId: string): Promise<StoredReport | null>;
  abstract workbook(reportId: string): Promise<Buffer | null>;
  abstract mail(reportId: string): Promise<ReportMail | null>;
  /** Newest week and version first. */
  abstract list(squadId: string): Promise<ReportMeta[]>;
  abstract insert(report: NewReport): Promise<void>;

  /** Adds what is not there yet; a recipient already on record keeps their row. */
  abstract addDeliveries(
    deliveries: readonly Pick<ReportDelivery, 'reportId' | 'personId' | 'email' | 'messageId'>[],
  ): Promise<void>;
  abstract deliveries(reportId: string): Promise<ReportDelivery[]>;
  /** The row, locked until the unit of work ends. */
  abstract lockDelivery(reportId: string, personId: string): Promise<ReportDelivery | null>;
  abstract setDelivery(
    reportId: string,
    personId: string,
    state: DeliveryState,
    detail: string,
    sentAt: Date | null,
  ): Promise<void>;
}
