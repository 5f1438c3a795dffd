/** A report as plain JSON: what workbook and mail show. Its shape belongs to the report that is made. */
export type ReportView = Record<string, unknown>;

/** What is printed about the record itself; not part of the view. */
export interface ReportEdition {
  version: number;
  change: string | null;
}

export interface ReportMail {
  subject: string;
  text: string;
  html: string;
}

export interface RenderedReport {
  workbook: Buffer;
  mail: ReportMail;
}

/** A report on record, without its files. */
export interface ReportMeta {
  id: string;
  squadId: string;
  isoWeek: string;
  version: number;
  /** Last closed day its figures rest on. */
  asOf: string;
  /** What differs from the version before, and why; null for the first. */
  change: string | null;
  viewHash: string;
  workbookHash: string;
  madeBy: string | null;
  madeAt: string;
}

/** With the name of its workbook, which follows the squad's name. */
export type NamedReport<Report extends ReportMeta = ReportMeta> = Report & { filename: string };

export interface StoredReport extends ReportMeta {
  view: ReportView;
}

export interface NewReport extends StoredReport {
  workbook: Buffer;
  mail: ReportMail;
}

export type DeliveryState = 'waiting' | 'sent' | 'failed';

export interface ReportDelivery {
  reportId: string;
  personId: string;
  email: string;
  messageId: string;
  state: DeliveryState;
  detail: string | null;
  sentAt: string | null;
}

export interface DeliveryCounts {
  waiting: number;
  sent: number;
  failed: number;
}
