import { z } from 'zod';
import { idSchema, isoWeekSchema, lineSchema } from '../../platform/schemas.ts';

export const reportParamsSchema = z.strictObject({ reportId: idSchema });
export const squadReportsParamsSchema = z.strictObject({ squadId: idSchema });
export const reportInputSchema = z.strictObject({ isoWeek: isoWeekSchema, change: lineSchema(300).optional() });
export type ReportInput = z.output<typeof reportInputSchema>;

export const reportMetaSchema = z.object({
  id: z.uuid(),
  squadId: z.uuid(),
  isoWeek: z.string(),
  version: z.number(),
  asOf: z.string(),
  change: z.string().nullable(),
  viewHash: z.string(),
  workbookHash: z.string(),
  madeBy: z.uuid().nullable(),
  madeAt: z.string(),
  files: z.array(z.object({ name: z.string(), path: z.string() })),
});
export const reportListSchema = z.object({ items: z.array(reportMetaSchema) });
export const reportSchema = reportMetaSchema.extend({ view: z.record(z.string(), z.unknown()) });

export const deliveryListSchema = z.object({
  items: z.array(
    z.object({
      reportId: z.uuid(),
      personId: z.uuid(),
      email: z.string(),
      messageId: z.string(),
      state: z.enum(['waiting', 'sent', 'failed']),
      detail: z.string().nullable(),
      sentAt: z.string().nullable(),
    }),
  ),
});
