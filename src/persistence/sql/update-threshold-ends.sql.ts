import type { Prisma } from '../generated/client.ts';

export interface ThresholdState {
  id: string;
  validTo: string | null;
  withdrawnAt: Date | null;
  withdrawnBy: string | null;
  withdrawReason: string | null;
}

/** Last days and withdrawals of several values, all at once. */
export async function updateThresholdEnds(
  tx: Prisma.TransactionClient,
  states: readonly ThresholdState[],
): Promise<void> {
  if (states.length === 0) return;
  await tx.$executeRaw`
    update threshold_value v set valid_to = s."validTo", withdrawn_at = s."withdrawnAt",
      withdrawn_by = s."withdrawnBy", withdraw_reason = s."withdrawReason"
    from jsonb_to_recordset(${JSON.stringify(states)}::jsonb)
      as s (id uuid, "validTo" date, "withdrawnAt" timestamptz, "withdrawnBy" uuid, "withdrawReason" text)
    where v.club_id = loadweir_club() and v.id = s.id`;
}
