import type {
  Quantity,
  ResolvedThreshold,
  ThresholdSet,
} from '../../../../src/features/thresholds/thresholds.types.ts';
import type { IntervalLine, WeighContext, WeighPolicy } from '../../../../src/features/sessions/sessions.types.ts';
import type { Weighable } from '../../../../src/features/sessions/weighing/weigh-domain.ts';

export const policy: WeighPolicy = {
  id: '0198f3a0-0000-7000-8000-000000000001',
  weights: { moderate: 1, heavy: 2, severe: 3, extreme: 3 },
  bound: { quantity: 'critical', fallbackLt2Method: null },
};

export function set(
  values: Partial<Record<Quantity, number>>,
  methods: Partial<Record<Quantity, string>> = {},
): ThresholdSet {
  return new Map(
    Object.entries(values).map(([name, value]): [Quantity, ResolvedThreshold] => {
      const quantity = name as Quantity;
      const method = methods[quantity] ?? 'step test';
      return [quantity, { quantity, id: `id of ${name}`, value, validFrom: '2026-01-05', method }];
    }),
  );
}

export function context(
  values: Partial<Record<Quantity, number>> = {},
  more: Partial<WeighContext> = {},
): WeighContext {
  return { thresholds: set(values), sex: 'female', policy, ...more };
}

export function session(more: Partial<Weighable> = {}): Weighable {
  return {
    durationMin: 60,
    modality: 'rowing',
    setting: 'ergometer',
    rating: null,
    meanHeartRateBpm: null,
    content: { kind: 'none' },
    ...more,
  };
}

export const intervals = (...lines: IntervalLine[]): Weighable['content'] => ({ kind: 'intervals', lines });
export const used = (weight: { thresholdsUsed: ResolvedThreshold[] }) =>
  weight.thresholdsUsed.map(({ quantity }) => quantity);
