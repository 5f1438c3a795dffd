import type { RenderedReport, ReportEdition, ReportView } from './reports.types.ts';

/** Makes one kind of report (port and DI token): first what it says, then how it looks. */
export abstract class ReportMaker {
  /** The view of a squad's week; `previous` is the view of the week before, for what is new and what is better. */
  abstract view(
    squadId: string,
    isoWeek: string,
    previous: ReportView | null,
  ): Promise<{ asOf: string; view: ReportView }>;
  /** What differs between two views of the same week, in words. */
  abstract differences(before: ReportView, after: ReportView): string;
  /** Workbook and mail; the same view and edition give the same bytes. */
  abstract render(view: ReportView, edition: ReportEdition): Promise<RenderedReport>;
  /** Unrounded figures of a view, one entry an athlete. */
  abstract measures(view: ReportView): unknown[];
}
