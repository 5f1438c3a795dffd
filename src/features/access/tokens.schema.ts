import { z } from 'zod';
import { idSchema, lineSchema } from '../../platform/schemas.ts';

export const tokenInputSchema = z.strictObject({ label: lineSchema(120), validDays: z.int().min(1).max(400) });
export type TokenInput = z.output<typeof tokenInputSchema>;

export const tokenParamsSchema = z.strictObject({ personId: idSchema, tokenId: idSchema });

export const issuedTokenSchema = z.object({
  id: z.uuid(),
  label: z.string(),
  secret: z.string().nullable().describe('Shown once; null when the answer is given again'),
  expiresAt: z.iso.datetime(),
});

export const tokenListSchema = z.object({
  items: z.array(
    z.object({
      id: z.uuid(),
      personId: z.uuid(),
      label: z.string(),
      createdAt: z.iso.datetime(),
      expiresAt: z.iso.datetime(),
      revokedAt: z.iso.datetime().nullable(),
    }),
  ),
});
