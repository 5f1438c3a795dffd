import { whole } from '../guard.ts';

/** Lengths of the windows and fewest known days in them [days]. */
export interface WindowOptions {
  readonly acuteDays?: number;
  readonly chronicDays?: number;
  readonly minAcuteKnown?: number;
  readonly minChronicKnown?: number;
}

/** The options with their defaults (7, 28; floors 6 and 24, own convention), checked. */
export function windowOptions(fn: string, options: WindowOptions): Required<WindowOptions> {
  const { acuteDays = 7, chronicDays = 28 } = options;
  whole(fn, 'acuteDays', acuteDays, 1);
  whole(fn, 'chronicDays', chronicDays, acuteDays + 1);
  const { minAcuteKnown = Math.round((acuteDays * 6) / 7), minChronicKnown = Math.round((chronicDays * 24) / 28) } =
    options;
  whole(fn, 'minAcuteKnown', minAcuteKnown, 1, acuteDays);
  whole(fn, 'minChronicKnown', minChronicKnown, 1, chronicDays);
  return { acuteDays, chronicDays, minAcuteKnown, minChronicKnown };
}

/** Quotient by day; NaN where the denominator is 0 or unknown. */
export function quotients(numerators: readonly number[], denominators: readonly number[]): number[] {
  return numerators.map((numerator, index) => {
    const denominator = denominators[index]!;
    return denominator > 0 ? numerator / denominator : NaN;
  });
}
