import type { ThresholdValueView } from './thresholds.schema.ts';
import { athleteQuantities, quantityRanges } from './thresholds.types.ts';
import type { ThresholdValue } from './thresholds.types.ts';

/** A value as the API shows it. */
export function presentThreshold(value: ThresholdValue): ThresholdValueView {
  const { athleteId: _, modality, enteredAt, withdrawnAt, ...rest } = value;
  return {
    ...rest,
    unit: quantityRanges[value.quantity].unit,
    modality: athleteQuantities.includes(value.quantity) ? null : modality,
    enteredAt: enteredAt.toISOString(),
    withdrawnAt: withdrawnAt?.toISOString() ?? null,
  };
}
