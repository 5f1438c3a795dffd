import { athleteQuantities } from './thresholds.types.ts';
import type { Modality, Quantity, ResolvedThreshold, Setting, ThresholdValue } from './thresholds.types.ts';

type Dated = ResolvedThreshold & Pick<ThresholdValue, 'modality' | 'setting' | 'validTo' | 'withdrawnAt'>;

/**
 * The set in force on a day, quantity by quantity: the value of that very setting if there is one, else the one for
 * any setting. Nothing is carried back before its test day and nothing is interpolated.
 */
export function resolveThresholds<V extends Dated>(
  values: readonly V[],
  day: string,
  modality: Modality,
  setting: Setting,
): Map<Quantity, V> {
  const set = new Map<Quantity, V>();
  for (const value of values) {
    if (!inForce(value, day) || !belongs(value, modality, setting)) continue;
    const other = set.get(value.quantity);
    if (other === undefined || (other.setting === 'any' && value.setting !== 'any')) set.set(value.quantity, value);
  }
  return set;
}

function inForce(value: Dated, day: string): boolean {
  return value.withdrawnAt === null && value.validFrom <= day && (value.validTo === null || day <= value.validTo);
}

function belongs(value: Dated, modality: Modality, setting: Setting): boolean {
  if (athleteQuantities.includes(value.quantity)) return true;
  return value.modality === modality && (value.setting === setting || value.setting === 'any');
}
