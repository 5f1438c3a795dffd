import { z } from 'zod';
import { emailSchema, lineSchema } from '../../platform/schemas.ts';

export const clubInputSchema = z.strictObject({
  name: lineSchema(200),
  admin: z.strictObject({ name: lineSchema(200), email: emailSchema }),
});
export type ClubInput = z.output<typeof clubInputSchema>;

export const clubMadeSchema = z.object({
  club: z.object({ id: z.uuid(), name: z.string() }),
  admin: z.object({ personId: z.uuid() }),
  token: z
    .object({ id: z.uuid(), secret: z.string(), expiresAt: z.iso.datetime() })
    .nullable()
    .describe('Shown once; null when the club was there already'),
});
export type ClubMade = z.output<typeof clubMadeSchema>;
