import { z } from 'zod';
import { idSchema, lineSchema, zoneSchema } from '../../platform/schemas.ts';

export const squadInputSchema = z.strictObject({ name: lineSchema(120), zone: zoneSchema });
export type SquadInput = z.output<typeof squadInputSchema>;

export const squadParamsSchema = z.strictObject({ squadId: idSchema });

export const squadSchema = z.object({ id: z.uuid(), name: z.string(), zone: z.string() });
export const squadListSchema = z.object({ items: z.array(squadSchema) });
