import type { LoadConcernDay, Muting } from '../types.ts';
import { rollingQuantile } from '../series/rolling-quantile.ts';
import type { Constituent } from './constituent.ts';
import { stretches } from './constituent.ts';
import type { LoadConcernSettings } from './load-concern-settings.ts';

const ACUTE_DAYS = 7;
const OWN_UPPER_END = 0.95;
const MUTED_BY: readonly (Muting | null)[] = ['planned-overload', 'return'];

/**
 * Stretches in which the acute:chronic ratio stood above the general limit and the athlete's own upper end.
 *
 * A week far above the athlete's recent weeks, and unusual for this athlete.
 *
 * @param days figures by day; ratio [no unit], NaN unknown or withheld
 * @param firstDay first day of the log [days since 1970-01-01]
 * @param settings limits, see there
 * @returns stretches with their evidence; value and limit [no unit]
 * @remarks Equation: raised when ratio > L, L = max(1.5, own 95th percentile of the ratios on t−188 … t−7); before 56 days of log L = 1.5.
 * Cleared when ratio ≤ 0.95·L on 3 judged days in a row. Limits: no lower limit; the band is the coupled form's and fits no other.
 * @see Gabbett TJ 2016, Br J Sports Med 50:273–280, doi 10.1136/bjsports-2015-095788 (1.5, quoted from another text); the rest: own convention
 * @example
 * ratioConcern([1.2, 1.6].map((ratio, day) => ({ day, ratio, chronic: 50, monotony: 1, strain: 400, muted: null, spike: null })), 0, loadConcernSettings({})).map((c) => c.since); // => [1]
 */
export function ratioConcern(
  days: readonly LoadConcernDay[],
  firstDay: number,
  settings: LoadConcernSettings,
): Constituent[] {
  const { ratioLimit, historyDays, historyMinDays, clearFactor, clearDays } = settings;
  const upperEnd = rollingQuantile(
    days.map((day) => day.ratio),
    historyDays,
    OWN_UPPER_END,
  );
  return stretches(
    days,
    (index) => {
      const { day, ratio, muted } = days[index]!;
      if (muted === 'unavailable') return { kind: 'absent' };
      if (MUTED_BY.includes(muted)) return { kind: 'muted' };
      if (Number.isNaN(ratio)) return { kind: 'silent' };
      const own = index >= ACUTE_DAYS && day - firstDay + 1 >= historyMinDays ? upperEnd[index - ACUTE_DAYS]! : NaN;
      const shortHistory = Number.isNaN(own);
      const limit = shortHistory ? ratioLimit : Math.max(ratioLimit, own);
      return {
        kind: 'judged',
        raised: ratio > limit,
        inside: ratio <= clearFactor * limit,
        strength: ratio / limit,
        evidence: { measure: 'ratio', value: ratio, limit, day, ...(shortHistory ? { shortHistory } : {}) },
      };
    },
    clearDays,
  );
}
