import { hooperSum } from '../../core/monitoring/hooper-sum.ts';
import { lnRmssd } from '../../core/monitoring/rmssd.ts';
import type { MorningReceipt, MorningView } from './mornings.schema.ts';
import type { Morning, MorningReadings } from './mornings.types.ts';

/** The sum of the four ratings; NaN where one is missing. */
function sumOf({ sleep, fatigue, stress, soreness }: Morning): number {
  return hooperSum(sleep ?? NaN, fatigue ?? NaN, stress ?? NaN, soreness ?? NaN);
}

export function presentMorning({ rrIntervalsMs, enteredAt, updatedAt, withdrawnAt, ...morning }: Morning): MorningView {
  const sum = sumOf({ rrIntervalsMs, enteredAt, updatedAt, withdrawnAt, ...morning });
  return {
    ...morning,
    sum: Number.isNaN(sum) ? null : sum,
    rrIntervals: rrIntervalsMs.length,
    enteredAt: enteredAt.toISOString(),
    updatedAt: updatedAt.toISOString(),
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
  };
}

/** What counts of a morning, late or not: the RMSSD of a suspect recording does not. */
export function readingsOf(morning: Morning): MorningReadings {
  const { athleteId, day, restingHeartRateBpm, rmssdMs, quality } = morning;
  return {
    ...{ athleteId, day, sum: sumOf(morning), restingHeartRateBpm: restingHeartRateBpm ?? NaN },
    lnRmssd: lnRmssd(quality === 'suspect' ? NaN : (rmssdMs ?? NaN)),
  };
}

export function receiptOf({ id, athleteId, day, version }: Morning): MorningReceipt {
  return { id, athleteId, day, version };
}
