import { athleteQuantities } from './thresholds.types.ts';
import type { Modality, Quantity, Setting, ThresholdValue } from './thresholds.types.ts';
import { resolveThresholds } from './resolve-thresholds.ts';

/** Lower, higher, and whether the two may be equal. */
const orders: readonly (readonly [Quantity, Quantity, 'below' | 'at most'])[] = [
  ['lt1-power', 'lt2-power', 'below'],
  ['lt1-power', 'critical-power', 'below'],
  ['lt1-speed', 'lt2-speed', 'below'],
  ['lt1-speed', 'critical-speed', 'below'],
  ['lt1-heart-rate', 'lt2-heart-rate', 'below'],
  ['lt1-heart-rate', 'max-heart-rate', 'below'],
  ['lt2-heart-rate', 'max-heart-rate', 'at most'],
  ['resting-heart-rate', 'max-heart-rate', 'below'],
];

/** Two values in force on one day of which the lower one is not lower. */
export interface OrderConflict {
  day: string;
  modality: Modality;
  setting: Setting;
  lower: ThresholdValue;
  higher: ThresholdValue;
  relation: 'below' | 'at most';
}

/**
 * Looks at the resolved set of every modality and setting on every day on which it changes and returns the first
 * conflict. LT1 has to be below LT2 as well as critical power or speed, whichever of them the policy names.
 */
export function orderConflict(values: readonly ThresholdValue[]): OrderConflict | undefined {
  const live = values.filter((value) => value.withdrawnAt === null);
  const days = [...new Set(live.map(({ validFrom }) => validFrom))].toSorted();
  const places = new Map(
    live
      .filter(({ quantity }) => !athleteQuantities.includes(quantity))
      .map(({ modality, setting }) => [`${modality}|${setting}`, { modality, setting }]),
  );
  for (const day of days) {
    for (const place of places.values()) {
      const set = resolveThresholds(live, day, place.modality, place.setting);
      const broken = orders
        .map(([low, high, relation]) => ({ lower: set.get(low), higher: set.get(high), relation }))
        .find(isBroken);
      if (broken !== undefined) return { day, ...place, ...broken };
    }
  }
  return undefined;
}

interface Pair {
  lower: ThresholdValue | undefined;
  higher: ThresholdValue | undefined;
  relation: 'below' | 'at most';
}

function isBroken(pair: Pair): pair is Pair & Pick<OrderConflict, 'lower' | 'higher'> {
  const { lower, higher, relation } = pair;
  if (lower === undefined || higher === undefined) return false;
  return relation === 'below' ? lower.value >= higher.value : lower.value > higher.value;
}
