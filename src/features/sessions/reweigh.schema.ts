import { z } from 'zod';
import { modalities, quantities, settings } from '../thresholds/thresholds.types.ts';

/** What a stored task is about, checked on reading. */
export const reweighScopeSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.literal('thresholds'),
    athleteId: z.uuid(),
    changes: z.array(
      z.object({
        quantity: z.enum(quantities),
        modality: z.enum(modalities),
        setting: z.enum(settings),
        from: z.string(),
        to: z.string().nullable(),
      }),
    ),
  }),
  z.object({ kind: z.literal('policy'), squadId: z.uuid(), from: z.string() }),
]);
